namespace Swarm.Engine.Summaries;

/// <summary>Where standard errors come from.</summary>
public enum ErrorMethod
{
    /// <summary>Closed forms; trials are independent.</summary>
    ClosedForm,

    /// <summary>The spread between whole batches; trials may depend on each other within blocks (stratified, re-ordered).</summary>
    Batches,
}
