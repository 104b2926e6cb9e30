namespace Swarm.Engine.Summaries;

/// <summary>A figure with its sampling error and 95 % interval, or with the reason why it has none.</summary>
/// <param name="Value">The figure.</param>
/// <param name="StandardError">Its standard error, or null.</param>
/// <param name="Low">Lower end of the 95 % interval, or null.</param>
/// <param name="High">Upper end of the 95 % interval, or null.</param>
/// <param name="Reason">Why there is no error; null where there is one.</param>
public readonly record struct Estimate(double Value, double? StandardError, double? Low, double? High, string? Reason)
{
    /// <summary>A figure without an error.</summary>
    public static Estimate Without(double value, string reason) => new(value, null, null, null, reason);
}

/// <summary>VaR and TVaR at a level.</summary>
/// <param name="P">The level; for an adverse low end the figures are those of the lower tail of size 1 - p.</param>
/// <param name="Var">Value at risk: the lower inverse of the distribution function.</param>
/// <param name="Tvar">Mean beyond, right where the distribution has atoms (Acerbi &amp; Tasche 2002).</param>
public sealed record LevelFigures(double P, Estimate Var, Estimate Tvar);

/// <summary>Probability to exceed a threshold.</summary>
public sealed record ExceedanceFigure(double Threshold, Estimate Probability);

/// <summary>All figures of one outcome.</summary>
public sealed record OutcomeFigures
{
    /// <summary>Name of the outcome as it is shown.</summary>
    public required string Name { get; init; }

    /// <summary>Mean.</summary>
    public required Estimate Mean { get; init; }

    /// <summary>Standard deviation.</summary>
    public required Estimate Sd { get; init; }

    /// <summary>Skewness.</summary>
    public required Estimate Skewness { get; init; }

    /// <summary>Least value seen.</summary>
    public required double Min { get; init; }

    /// <summary>Greatest value seen.</summary>
    public required double Max { get; init; }

    /// <summary>VaR and TVaR at the asked levels.</summary>
    public required IReadOnlyList<LevelFigures> Levels { get; init; }

    /// <summary>Exceedance probabilities at the asked thresholds.</summary>
    public required IReadOnlyList<ExceedanceFigure> Above { get; init; }
}
