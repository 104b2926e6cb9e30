namespace Swarm.Engine.Plans;

/// <summary>A fault as the executor notices it.</summary>
/// <param name="Trial">The trial.</param>
/// <param name="Operation">Index of the check among the plan's operations: the earlier is the cause.</param>
internal readonly record struct TileFault(long Trial, int Operation)
{
    /// <summary>The fault to report of two: the lower trial, then the earlier operation.</summary>
    public static TileFault? First(TileFault? a, TileFault? b)
    {
        if (a is not { } x)
        {
            return b;
        }

        return b is { } y && (y.Trial, y.Operation).CompareTo((x.Trial, x.Operation)) < 0 ? y : x;
    }
}
