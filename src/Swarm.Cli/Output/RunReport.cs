using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Output;

/// <summary>A run record as a page of text.</summary>
internal sealed class RunReport(RunRecord record, RunReportOptions options)
{
    private const int Width = RunReportOptions.Width;

    public void Write(TextWriter output)
    {
        WriteHead(output);
        foreach (var family in Families()) WriteFamily(output, family);
        foreach (var table in record.Tables.Where(table => options.Full || !ReportTableCodes.IsDiagnostic(table.Code)))
        {
            output.WriteLine();
            ReportTableText.Write(output, Width, table);
        }

        WriteNotes(output);
    }

    private void WriteHead(TextWriter output)
    {
        Paragraph.Write(output, Width, record.Title);
        Paragraph.Write(output, Width, record.Model.Name, "  model    ");
        output.WriteLine($"  trials   {NumberText.Count(record.Trials)}");
        output.WriteLine($"  seed     {record.Seed}");
        output.WriteLine($"  edition  {record.Edition}");
        output.WriteLine($"  digest   {record.Digest}");
        if (record.Money is { } money) output.WriteLine($"  money    in {UnitText.Of(money)}");
    }

    /// <summary>Outcomes of the model in their order, each with its parts.</summary>
    private IEnumerable<IGrouping<string, ReportedResult>> Families() => record.Outcomes.GroupBy(outcome => outcome.Parent);

    private void WriteFamily(TextWriter output, IGrouping<string, ReportedResult> family)
    {
        var expected = family.FirstOrDefault(part => part.Group == OutcomeGroup.Expected);
        foreach (var whole in family.Where(part => part.Group == OutcomeGroup.Whole)) WriteBlock(output, whole, expected);
        foreach (var group in family.Where(IsPart).GroupBy(part => part.Group))
        {
            if (options.Full)
                foreach (var part in group) WriteBlock(output, part, null);
            else
                WriteGroup(output, family.Key, group);
        }
    }

    private void WriteBlock(TextWriter output, ReportedResult outcome, ReportedResult? expected)
    {
        output.WriteLine();
        if (Chance.Of(outcome.Result, outcome.IsMoney, options.Errors) is { } probability)
        {
            Paragraph.Write(output, Width, outcome.Result.Request.Name);
            FigureBlock.Write(output, Width, probability);
            return;
        }

        Paragraph.Write(output, Width, TitleOf(outcome));
        ErrorParts? parts = expected is null ? null : ErrorParts.Of(outcome.Result, expected.Result, options.Errors);
        FigureBlock.Write(output, Width, Figures.Of(outcome.Result, options.Errors), parts);
    }

    private void WriteGroup(TextWriter output, string parent, IGrouping<OutcomeGroup, ReportedResult> group)
    {
        output.WriteLine();
        Paragraph.Write(output, Width, $"{parent} by {GroupTitle(group.Key)}{SideOf(group.First())}");
        GroupTable.Write(output, Width, group.Key, [.. group.Select(part => (part.Label, Figures.Of(part.Result, options.Errors)))]);
    }

    private void WriteNotes(TextWriter output)
    {
        output.WriteLine();
        output.WriteLine("Notes");
        foreach (var note in record.Notes) Paragraph.Write(output, Width, note.Text, "  - ");
        if (!options.Full && record.Outcomes.Any(IsPart))
            Paragraph.Write(output, Width, "Intervals of the parts, and what a part leaves out here, come with --full or --json.", "  - ");
        foreach (var caution in Cautions.Lines) Paragraph.Write(output, Width, caution, "  - ");
    }

    private static bool IsPart(ReportedResult outcome) => outcome.Group is not (OutcomeGroup.Whole or OutcomeGroup.Expected);

    private static string TitleOf(ReportedResult outcome) => $"{outcome.Result.Request.Name}{SideOf(outcome)}";

    private static string SideOf(ReportedResult outcome) =>
        outcome.Result.Request.Adverse == Adverse.Low ? " (low values hurt: VaR and TVaR look at the lower tail)" : "";

    private static string GroupTitle(OutcomeGroup group) => group switch
    {
        OutcomeGroup.Origin => "origin period",
        OutcomeGroup.Calendar => "calendar period of payment",
        _ => "step",
    };
}

/// <summary>How a run is shown.</summary>
/// <param name="Errors">Where standard errors come from.</param>
/// <param name="Full">True for all figures of every part.</param>
internal sealed record RunReportOptions(ErrorMethod Errors, bool Full)
{
    /// <summary>Columns that a page keeps to.</summary>
    public const int Width = 80;
}

/// <summary>The unit of money in words.</summary>
internal static class UnitText
{
    public static string Of(Money money) => money.Scale == 1 ? money.Unit : $"units of {NumberText.Short(money.Scale)} {money.Unit}";
}
