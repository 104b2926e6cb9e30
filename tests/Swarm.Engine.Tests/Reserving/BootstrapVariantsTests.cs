using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>The bootstrap where triangle or options leave the plain case: its mean meets the chain ladder.</summary>
public sealed class BootstrapVariantsTests
{
    public static TheoryData<string, ReservingOptions> Variants => new()
    {
        { "gamma", new ReservingOptions() },
        { "over-dispersed Poisson", new ReservingOptions { Process = ProcessError.OverDispersedPoisson } },
        { "scale by development", new ReservingOptions { Scale = ScaleForm.ByDevelopment } },
        {
            "last periods and exclusions",
            new ReservingOptions { LastPeriods = 6, Excluded = [(4, 2), (6, 0)], CentreResiduals = true }
        },
        { "simple average", new ReservingOptions { Average = LinkRatioAverage.Simple } },
        { "tail", new ReservingOptions { Tail = new TailOptions { Factor = 1.01, Sd = 0.004, Periods = 3 } } },
        { "fitted tail", new ReservingOptions { Tail = new TailOptions { Periods = 4 }, Scale = ScaleForm.ByDevelopment } },
        { "zeros dropped, centred", new ReservingOptions { KeepZeroResiduals = false, CentreResiduals = true } },
        { "booked", new ReservingOptions { Booked = new BookedEstimate(3e6, BookedForm.Shift) } },
    };

    [Theory]
    [MemberData(nameof(Variants))]
    public void The_mean_is_the_chain_ladder_reserve(string name, ReservingOptions options)
    {
        Assert.NotEmpty(name);
        AssertMean(Triangles.Load("mw2008"), options);
    }

    [Theory]
    [InlineData(ProcessError.Gamma)]
    [InlineData(ProcessError.OverDispersedPoisson)]
    public void Developments_and_origins_without_amounts_stay_at_zero(ProcessError process)
    {
        Triangle triangle = Triangles.OfCumulative(
            [1_000, 1_600, 1_800, 1_800, 1_800],
            [1_100, 1_700, 1_880, 1_880],
            [950, 1_500, 1_710],
            [0, 0],
            [1_050]);

        AssertMean(triangle, new ReservingOptions { Process = process });
        AssertMean(triangle, new ReservingOptions { Process = process, Scale = ScaleForm.ByDevelopment });
    }

    /// <summary>Four standard errors, and 0.3 % for the bias of resampled ratios.</summary>
    private static void AssertMean(Triangle triangle, ReservingOptions options)
    {
        double reserve = options.Booked?.BestEstimate ?? Triangles.ChainLadder(triangle, options).TotalReserve;

        OutcomeFigures total = TriangleRun.Unpaid(triangle, options);

        Assert.Equal(reserve, total.Mean.Value, (4 * total.Mean.StandardError!.Value) + (0.003 * reserve));
    }
}
