using Swarm.Engine.Reserving;

namespace Swarm.Engine.Records;

/// <summary>Tables by which a fit is judged. Residuals that are zero by construction or do not count say nothing and are left out.</summary>
internal static class ResidualTables
{
    /// <summary>By cell; by origin, development and calendar period; and the calendar year test.</summary>
    public static IEnumerable<ReportTable> Of(string name, ReservingFit fit)
    {
        ResidualTable table = ResidualTable.Of(fit);
        yield return Groups(name, "residuals-by-origin", "residuals by origin period", "origin", table.ByOrigin);
        yield return Groups(name, "residuals-by-development", "residuals by development period", "development", table.ByDevelopment);
        yield return Groups(name, "residuals-by-calendar", "residuals by calendar period", "calendar", table.ByCalendar);
        yield return CalendarYears(name, CalendarYearTest.Of(fit.ChainLadder.Ratios));
        Residual[] telling = [.. table.Residuals.Where(residual => residual is { IsCounted: true, IsZeroByConstruction: false })];
        yield return Cells(name, fit.ChainLadder.Triangle, telling);
    }

    private static ReportTable Groups(string name, string code, string title, string heading, IReadOnlyList<ResidualGroup> groups) => new(
        code,
        name,
        title,
        [
            ReportColumn.OfLabels(heading, [.. groups.Select(group => group.Label)]),
            ReportColumn.OfNumbers("residuals", ColumnKind.Count, [.. groups.Select(group => (double)group.Count)]),
            ReportColumn.OfNumbers("mean", ColumnKind.Number, [.. groups.Select(group => group.Mean)]),
            ReportColumn.OfNumbers("mean square", ColumnKind.Number, [.. groups.Select(group => group.MeanSquare)]),
        ]);

    private static ReportTable CalendarYears(string name, CalendarYearTest test) => new(
        ReportTableCodes.CalendarTest,
        name,
        "link ratios below and above their development's median, by calendar period",
        [
            ReportColumn.OfLabels("calendar", [.. test.Years.Select(year => year.Label)]),
            ReportColumn.OfNumbers("below", ColumnKind.Count, [.. test.Years.Select(year => (double)year.Small)]),
            ReportColumn.OfNumbers("above", ColumnKind.Count, [.. test.Years.Select(year => (double)year.Large)]),
        ]);

    private static ReportTable Cells(string name, Triangle triangle, IReadOnlyList<Residual> residuals) => new(
        ReportTableCodes.Residuals,
        name,
        "scaled residuals by cell",
        [
            ReportColumn.OfLabels(ResidualColumns.Origin, [.. residuals.Select(residual => triangle.Origins[residual.Origin])]),
            ReportColumn.OfNumbers(ResidualColumns.Development, ColumnKind.Count, [.. residuals.Select(residual => residual.Development + 1.0)]),
            ReportColumn.OfLabels(
                ResidualColumns.Calendar, [.. residuals.Select(residual => PeriodLabel.Add(triangle.Origins[0], residual.Calendar))]),
            ReportColumn.OfNumbers("observed", ColumnKind.Money, [.. residuals.Select(residual => residual.Observed)]),
            ReportColumn.OfNumbers("fitted", ColumnKind.Money, [.. residuals.Select(residual => residual.Fitted)]),
            ReportColumn.OfNumbers(ResidualColumns.Residual, ColumnKind.Number, [.. residuals.Select(residual => residual.Scaled)]),
        ]);
}
