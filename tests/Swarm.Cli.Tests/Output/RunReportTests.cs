using Swarm.Cli.Output;
using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Output;

public sealed class RunReportTests(SampleRecord sample) : IClassFixture<SampleRecord>
{
    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void No_line_is_longer_than_eighty_columns(bool full)
    {
        var lines = Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, full));

        Assert.All(lines, line => Assert.InRange(line.Length, 0, 80));
    }

    [Fact]
    public void A_long_title_and_long_names_keep_to_eighty_columns()
    {
        var titled = sample.Record with { Title = string.Join(' ', Enumerable.Repeat("Larkfell", 30)) };

        Assert.All(Page(titled, new RunReportOptions(ErrorMethod.Batches, true)), line => Assert.InRange(line.Length, 0, 80));
    }

    [Fact]
    public void There_is_no_colour_and_no_tab() =>
        Assert.DoesNotContain(Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, true)), line => line.Any(char.IsControl));

    [Fact]
    public void The_head_names_what_the_run_is_known_by()
    {
        var page = Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, false));

        Assert.Equal("Larkfell Mutual, a sample of everything that is shown", page[0]);
        Assert.Contains("  model    sample.yaml", page);
        Assert.Contains("  trials   20,000", page);
        Assert.Contains("  seed     7", page);
        Assert.Contains($"  digest   {sample.Record.Digest}", page);
        Assert.Contains("  money    in units of 1,000 crown", page);
    }

    [Fact]
    public void Parts_are_shown_as_tables_and_in_full_when_asked()
    {
        var brief = Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, false));
        var full = Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, true));

        Assert.Contains("motor.unpaid by origin period", brief);
        Assert.Contains("motor.unpaid by calendar period of payment", brief);
        Assert.Contains("fund[t] by step (low values hurt: VaR and TVaR look at the lower tail)", brief);
        Assert.DoesNotContain("motor.unpaid.2023", brief);
        Assert.Contains("motor.unpaid.2023", full);
        Assert.DoesNotContain("motor: scaled residuals by cell", brief);
        Assert.Contains("motor: scaled residuals by cell", full);
    }

    [Fact]
    public void A_missing_error_leads_to_its_reason()
    {
        var page = Page(SampleRuns.Build(500), new RunReportOptions(ErrorMethod.ClosedForm, false));

        Assert.Contains(page, line => line.StartsWith("  mean ", StringComparison.Ordinal) && line.EndsWith("(a)", StringComparison.Ordinal));
        Assert.Contains("  (a) no error: fewer than 1,000 trials", page);
    }

    [Fact]
    public void A_yes_or_no_has_a_probability_and_no_tail_figures()
    {
        var page = Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, false));
        var block = page.SkipWhile(line => line != "ruined").TakeWhile(line => line.Length > 0).ToArray();

        Assert.Equal(3, block.Length);
        Assert.StartsWith("  probability ", block[2], StringComparison.Ordinal);
    }

    [Fact]
    public void Cautions_end_every_page()
    {
        var page = string.Join(' ', Page(sample.Record, new RunReportOptions(ErrorMethod.ClosedForm, false)).Select(line => line.Trim()));

        Assert.All(Cautions.Lines, caution => Assert.Contains(caution, page, StringComparison.Ordinal));
        Assert.Contains("residual bootstrap of the over-dispersed Poisson model", page, StringComparison.Ordinal);
    }

    private static string[] Page(RunRecord record, RunReportOptions options)
    {
        var output = new StringWriter();
        new RunReport(record, options).Write(output);
        return output.ToString().TrimEnd().Split(Environment.NewLine);
    }
}
