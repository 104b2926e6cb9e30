namespace Swarm.Engine.Streams;

/// <summary>What a key's random numbers are for. A new use gets a new role, so that it moves no other number.</summary>
internal static class StreamRoles
{
    /// <summary>The value of a draw.</summary>
    public const string Draw = "draw";

    /// <summary>Which residuals a pseudo-triangle is made of.</summary>
    public const string Residuals = "residuals";

    /// <summary>Sampling error of development factors.</summary>
    public const string Factors = "factors";

    /// <summary>Process error of future amounts.</summary>
    public const string Process = "process";

    /// <summary>The tail factor.</summary>
    public const string Tail = "tail";
}
