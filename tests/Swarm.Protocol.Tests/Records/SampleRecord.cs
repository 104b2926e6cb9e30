using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Protocol.Tests.Records;

/// <summary>A small record with every field filled, made of parts and not of a run, so that it never changes with the engine.</summary>
internal static class SampleRecord
{
    public static RunRecord Build() => new()
    {
        Edition = 1,
        ToolVersion = "0.1.0",
        Seed = 0xFEDC_BA98_7654_3210,
        Trials = 8,
        Title = "Larkfell Mutual, a sample",
        Money = new Money("crown", 1000),
        Model = new RecordedModel("sample.yaml", "model: Larkfell Mutual, a sample\r\ntriangles: é\n"),
        Data = [new RecordedData("motor-paid.csv", new byte[] { 0, 1, 254, 255, 13, 10 })],
        Outcomes =
        [
            Outcome("motor.unpaid", Adverse.High, OutcomeGroup.Whole, "motor.unpaid", ""),
            Outcome("motor.unpaid.2017", Adverse.High, OutcomeGroup.Origin, "motor.unpaid", "2017"),
            Outcome("motor.paid.2026", Adverse.High, OutcomeGroup.Calendar, "motor.unpaid", "2026"),
            Outcome("motor.expected", Adverse.High, OutcomeGroup.Expected, "motor.unpaid", ""),
            Outcome("fund[30]", Adverse.Low, OutcomeGroup.Step, "fund[t]", "30"),
        ],
        Notes = [new Note("redrawn", "Pseudo-triangles drawn again: 12 of 8.", 12), new Note("method", "Residuals are not centred.")],
        Tables = [Residuals()],
    };

    private static ReportedResult Outcome(string name, Adverse adverse, OutcomeGroup group, string parent, string label)
    {
        var request = new OutcomeRequest(name, adverse, [0.9, 0.33], [2.5, 100]);
        var summary = OutcomeSummary.FromParts(
            Moments(8), [5, 0], TDigest.FromClusters([-1, 2, 3.5, 7], [2, 1, 3, 2], [true, true, false, true], 8), []);
        var levels = BatchLevels.For(request).Length;
        double[] tail = [.. Enumerable.Range(0, levels).Select(i => i / 4.0)];
        BatchFigures[] batches =
            [.. Enumerable.Range(0, 2).Select(_ => new BatchFigures(Moments(4), [3, 0], tail, tail))];
        return new ReportedResult(new OutcomeResult(request, summary, 4, batches), group, parent, label, group != OutcomeGroup.Step);
    }

    private static Moments Moments(long count) =>
        new() { Count = count, Mean = 3.0625, M2 = 61, M3 = -4.5, M4 = 1e300, M5 = double.PositiveInfinity, M6 = double.NaN, Min = -1, Max = 7 };

    private static ReportTable Residuals() => new(
        ReportTableCodes.Residuals,
        "motor",
        "Residuals by cell",
        [
            ReportColumn.OfLabels(ResidualColumns.Origin, ["2016", "2017"]),
            ReportColumn.OfNumbers(ResidualColumns.Development, ColumnKind.Count, [1, 2]),
            ReportColumn.OfNumbers(ResidualColumns.Residual, ColumnKind.Number, [-0.5, double.NaN]),
            ReportColumn.OfNumbers("amount", ColumnKind.Money, [17, 1e12]),
            ReportColumn.OfNumbers("share", ColumnKind.Share, [0.25, 0.75]),
        ]);
}
