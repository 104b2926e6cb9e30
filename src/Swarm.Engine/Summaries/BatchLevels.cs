namespace Swarm.Engine.Summaries;

/// <summary>The levels at which every batch keeps VaR and TVaR: a standard grid, and the asked levels.</summary>
public static class BatchLevels
{
    private static readonly double[] _standard =
        [0.001, 0.005, 0.01, 0.025, 0.05, 0.10, 0.25, 0.50, 0.75, 0.90, 0.95, 0.975, 0.99, 0.995, 0.999];

    /// <summary>The standard grid, 0.1 % to 99.9 %.</summary>
    public static IReadOnlyList<double> Standard => _standard;

    /// <summary>The grid and the asked levels together, ascending, each once.</summary>
    public static double[] For(OutcomeRequest request) => [.. _standard.Concat(request.Levels).Distinct().Order()];
}
