using System.Globalization;

namespace Swarm.Engine.Reserving;

/// <summary>Scaled residuals gathered by origin, development and calendar period: where a group's mean is far from 0, or its mean
/// square far from 1, the model misses something.</summary>
public sealed class ResidualTable
{
    private ResidualTable(Triangle triangle, IReadOnlyList<Residual> residuals)
    {
        Residuals = residuals;
        ByOrigin = Groups(residuals, r => r.Origin, i => triangle.Origins[i]);
        ByDevelopment = Groups(residuals, r => r.Development, j => (j + 1).ToString(CultureInfo.InvariantCulture));
        ByCalendar = Groups(residuals, r => r.Calendar, c => PeriodLabel.Add(triangle.Origins[0], c));
    }

    /// <summary>Residuals of all known cells that have one, in order of development, then origin.</summary>
    public IReadOnlyList<Residual> Residuals { get; }

    /// <summary>By origin period, oldest first.</summary>
    public IReadOnlyList<ResidualGroup> ByOrigin { get; }

    /// <summary>By development period, counted from 1.</summary>
    public IReadOnlyList<ResidualGroup> ByDevelopment { get; }

    /// <summary>By calendar period, oldest first.</summary>
    public IReadOnlyList<ResidualGroup> ByCalendar { get; }

    /// <summary>The table of a fit, of whichever method.</summary>
    public static ResidualTable Of(ReservingFit fit) =>
        new(fit.ChainLadder.Triangle, fit.Odp is { } odp ? odp.Residuals : MackResiduals.Of(fit.Mack!));

    /// <summary>Residuals that are zero by construction, or do not count, say nothing about the model.</summary>
    private static ResidualGroup[] Groups(
        IReadOnlyList<Residual> residuals, Func<Residual, int> key, Func<int, string> label) =>
    [
        .. residuals
            .Where(r => r.IsCounted && !r.IsZeroByConstruction)
            .GroupBy(key)
            .OrderBy(group => group.Key)
            .Select(group => ResidualGroup.Of(label(group.Key), group)),
    ];
}
