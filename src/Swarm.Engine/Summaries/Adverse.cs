namespace Swarm.Engine.Summaries;

/// <summary>Which end of an outcome hurts.</summary>
public enum Adverse
{
    /// <summary>Large values hurt (claims).</summary>
    High,

    /// <summary>Small values hurt (a fund).</summary>
    Low,
}
