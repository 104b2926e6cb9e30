using Swarm.Engine.Reserving;

namespace Swarm.Engine.Records;

/// <summary>The table by development period.</summary>
internal static class DevelopmentTable
{
    /// <summary>Factors, with what measures their uncertainty: Mack's sigmas, or the scales and the residuals behind each.</summary>
    public static ReportTable Of(string name, ReservingFit fit)
    {
        IReadOnlyList<double> factors = fit.Mack?.Factors ?? fit.ChainLadder.Factors;
        int[] steps = [.. Enumerable.Range(0, factors.Count)];
        List<ReportColumn> columns =
        [
            ReportColumn.OfLabels("development", [.. steps.Select(step => StepName(step, fit.ChainLadder.Factors.Count))]),
            ReportColumn.OfNumbers("factor", ColumnKind.Number, factors),
        ];
        if (fit.Mack is { } mack)
        {
            columns.Add(ReportColumn.OfNumbers("its error", ColumnKind.Number, mack.FactorErrors));
            columns.Add(ReportColumn.OfNumbers("sigma", ColumnKind.Number, [.. mack.SigmaSquared.Select(Math.Sqrt)]));
        }
        else if (fit.Odp is { } odp)
        {
            ScaleGroup[] groups = [.. steps.Select(step => odp.Scales.First(group => step + 1 <= group.Last))];
            columns.Add(ReportColumn.OfNumbers("scale", ColumnKind.Money, [.. groups.Select(group => group.Scale)]));
            columns.Add(ReportColumn.OfNumbers("residuals", ColumnKind.Count, [.. groups.Select(group => (double)group.Residuals)]));
        }

        return new ReportTable("development", name, "development factors", columns);
    }

    private static string StepName(int step, int insideTriangle) => step < insideTriangle ? $"{step + 1} to {step + 2}" : "tail";
}
