using System.Globalization;
using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving.Simulation;

/// <summary>
/// The bootstrap against an independent program's figures from 2,000,000 replications (see the data file): within 4 standard
/// errors, ours and theirs together.
/// </summary>
public sealed class BootstrapReferenceTests
{
    private const long Trials = 1_000_000;
    private const double Limit = 4;

    private static readonly Lazy<Dictionary<string, OutcomeFigures>> Constant =
        new(() => TaylorAshe.Figures(new ReservingOptions(), Trials));

    public static TheoryData<int> Origins => [2, 3, 4, 5, 6, 7, 8, 9, 10];

    [Theory]
    [MemberData(nameof(Origins))]
    public void Origins_agree_with_the_reference(int origin)
    {
        OutcomeFigures figures = Constant.Value[$"t.unpaid.{2000 + origin}"];

        AssertAgrees($"origin_{origin}.mean", figures.Mean);
        AssertAgrees($"origin_{origin}.prediction_sd", figures.Sd);
        AssertLevelsAgree($"origin_{origin}.quantiles", figures);
    }

    [Fact]
    public void The_total_agrees_with_the_reference()
    {
        OutcomeFigures total = Constant.Value["t.unpaid"];

        AssertAgrees("total.mean", total.Mean);
        AssertAgrees("total.prediction_sd", total.Sd);
        AssertLevelsAgree("total.quantiles", total);
        AssertAgrees("total.estimation_sd", Constant.Value["t.expected"].Sd);
    }

    [Fact]
    public void The_total_agrees_with_the_published_simulation()
    {
        // England & Verrall (2002), British Actuarial Journal 8: 2,992,296 from 1,000 replications (from memory), so its own
        // standard error is about sd / sqrt(2 * 1,000), or 2.3 %.
        const double Published = 2_992_296;

        double sd = Constant.Value["t.unpaid"].Sd.Value;

        Assert.InRange((sd - Published) / (Published / Math.Sqrt(2_000)), -3, 3);
    }

    [Fact]
    public void Leaving_out_the_zero_residuals_agrees_with_the_reference()
    {
        OutcomeFigures total = TaylorAshe.Figures(new ReservingOptions { KeepZeroResiduals = false }, Trials)["t.unpaid"];

        AssertAgrees("total.prediction_sd_without_zero_residuals", total.Sd);
        AssertLevelsAgree("total.quantiles_without_zero_residuals", total);
    }

    [Fact]
    public void An_over_dispersed_Poisson_process_agrees_with_the_reference()
    {
        OutcomeFigures total = TaylorAshe.Figures(new ReservingOptions { Process = ProcessError.OverDispersedPoisson }, Trials)["t.unpaid"];

        AssertAgrees("total.prediction_sd_scaled_poisson_process", total.Sd);
        AssertLevelsAgree("total.quantiles_scaled_poisson_process", total);
    }

    private static void AssertLevelsAgree(string name, OutcomeFigures figures)
    {
        foreach (LevelFigures level in figures.Levels)
        {
            AssertAgrees($"{name}.{level.P.ToString(CultureInfo.InvariantCulture)}", level.Var);
        }
    }

    private static void AssertAgrees(string name, Estimate ours)
    {
        string[] fields = TestFile.Lines("taylor-ashe-bootstrap.csv").Select(line => line.Split(',')).Single(line => line[0] == name);
        double theirs = double.Parse(fields[1], CultureInfo.InvariantCulture);
        double error = double.Parse(fields[2], CultureInfo.InvariantCulture);

        double distance = (ours.Value - theirs) / Math.Sqrt((error * error) + (ours.StandardError!.Value * ours.StandardError.Value));

        Assert.True(Math.Abs(distance) < Limit, $"{name}: {ours.Value} against {theirs}, {distance:F2} standard errors apart");
    }
}
