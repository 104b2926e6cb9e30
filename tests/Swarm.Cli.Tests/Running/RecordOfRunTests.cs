using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;
using Swarm.Protocol.Records;

namespace Swarm.Cli.Tests.Running;

public sealed class RecordOfRunTests(SampleRecord sample) : IClassFixture<SampleRecord>
{
    [Fact]
    public void A_triangle_reports_its_formulas_and_its_diagnostics() =>
        Assert.Equal(
            [
                "reserves", "comparison", "development", "residuals-by-origin", "residuals-by-development", "residuals-by-calendar",
                "calendar-test", "residuals",
            ],
            sample.Record.Tables.Select(table => table.Code));

    [Fact]
    public void Reserves_are_what_is_left_of_the_ultimate()
    {
        var table = TableOf("reserves");

        var (paid, ultimate, reserve) = (Numbers(table, "to date"), Numbers(table, "ultimate"), Numbers(table, "reserve"));
        Assert.Equal(7, table.Rows);
        Assert.All(Enumerable.Range(0, table.Rows), row => Assert.Equal(ultimate[row] - paid[row], reserve[row], 1e-9));
        Assert.Equal(reserve.Take(6).Sum(), reserve[6], 1e-9);
    }

    [Fact]
    public void The_simulated_total_stands_beside_the_chain_ladder_with_its_difference()
    {
        var table = TableOf("comparison");
        var mean = Figures.Of(sample.Record.Outcomes.First(outcome => outcome.Result.Request.Name == "motor.unpaid").Result, ErrorMethod.ClosedForm).Mean;

        Assert.Equal("total", table.Column("origin")!.Labels[^1]);
        Assert.Equal(mean.Value, Numbers(table, "simulated mean")[^1]);
        Assert.Equal(mean.Value - Numbers(TableOf("reserves"), "reserve")[^1], Numbers(table, "difference")[^1], 1e-9);
        Assert.Equal(mean.StandardError, Numbers(table, "its error")[^1]);
    }

    [Fact]
    public void Residuals_that_are_zero_by_construction_are_left_out() => Assert.Equal(21 - 2, TableOf("residuals").Rows);

    [Fact]
    public void The_notes_state_the_method_and_the_calendar_year_test()
    {
        Assert.Equal(["method", "effect", "calendar-year-effect"], sample.Record.Notes.Select(note => note.Code));
        Assert.Contains("residuals not centred", sample.Record.Notes[0].Text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_whole_record_survives_the_disk()
    {
        var read = RecordReader.Read(RecordWriter.ToBytes(sample.Record)).Record!;

        Assert.Equal(RecordWriter.ToBytes(sample.Record), RecordWriter.ToBytes(read));
        Assert.Equal(sample.Record.Digest, read.Digest);
    }

    private ReportTable TableOf(string code) => sample.Record.Tables.Single(table => table.Code == code);

    private static IReadOnlyList<double> Numbers(ReportTable table, string column) => table.Column(column)!.Numbers;
}
