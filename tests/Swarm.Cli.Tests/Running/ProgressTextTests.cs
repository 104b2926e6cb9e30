using Swarm.Cli.Running;
using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Running;

public class ProgressTextTests
{
    [Fact]
    public void The_bar_tells_share_rate_and_time_left() =>
        Assert.Equal(
            "██████░░░░░░░░░░░░░░░░░░  25 %  1.25 million trials/s  0:06 left",
            ProgressText.Bar(new RunProgress(2_500_000, 10_000_000, _ => null), TimeSpan.FromSeconds(2)));

    [Fact]
    public void A_long_wait_is_told_in_hours() =>
        Assert.EndsWith("100 trials/s  2:46:30 left", ProgressText.Bar(new RunProgress(1_000, 1_000_000, _ => null), TimeSpan.FromSeconds(10)), StringComparison.Ordinal);

    [Fact]
    public void The_closing_line_tells_time_and_rate() =>
        Assert.Equal("50,000 trials in 2.0 s, 25,000 trials/s", ProgressText.Closing(50_000, TimeSpan.FromSeconds(2)));

    [Fact]
    public void Lines_fit_a_terminal_of_eighty_columns()
    {
        var figures = new OutcomeFigures
        {
            Name = "motor.unpaid",
            Mean = new Estimate(18_680_856, 302, 0, 0, null),
            Sd = default,
            Skewness = default,
            Min = 0,
            Max = 0,
            Levels = [new LevelFigures(0.5, default, default), new LevelFigures(0.995, new Estimate(27_310_123, 4_021, 0, 0, null), default)],
            Above = [],
        };

        var line = ProgressText.Figures(figures);

        Assert.Equal("motor.unpaid: mean 18,680,860 ± 300   VaR 99.5 % 27,310,100 ± 4,000", line);
        Assert.InRange(ProgressText.Bar(new RunProgress(1, 1L << 48, _ => null), TimeSpan.FromDays(2)).Length, 0, 80);
    }

    [Fact]
    public void The_first_outcome_is_shown_at_its_last_step()
    {
        var model = SampleRuns.Model();
        model = model with { Outcomes = [.. model.Outcomes.Where(outcome => outcome.Name == "fund")] };
        string? shown = null;

        LocalRun.Execute(
            model,
            new RunSettings { Seed = 1, Trials = 2000, Threads = 1 },
            progress => shown = new FeaturedOutcome(model).Figures(progress)?.Name,
            TestContext.Current.CancellationToken);

        Assert.Equal("fund[5]", shown);
    }
}
