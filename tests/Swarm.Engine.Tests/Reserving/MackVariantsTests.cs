using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>The simulation of Mack's model where its options leave the plain case, against the closed forms of Mack (1999).</summary>
public sealed class MackVariantsTests
{
    [Theory]
    [InlineData(ProcessError.Gamma, LinkRatioAverage.Simple)]
    [InlineData(ProcessError.Lognormal, LinkRatioAverage.Simple)]
    [InlineData(ProcessError.Gamma, LinkRatioAverage.VolumeWeighted)]
    public void A_run_with_a_tail_has_the_mean_and_error_of_the_closed_form(ProcessError process, LinkRatioAverage average)
    {
        var options = new ReservingOptions
        {
            Method = ReservingMethod.Mack,
            Process = process,
            Average = average,
            Tail = new TailOptions { Factor = 1.02, Sd = 0.01, Periods = 2 },
        };
        Triangle triangle = Triangles.Load("mw2008");
        Mack mack = Triangles.Mack(triangle, options);

        OutcomeFigures total = TriangleRun.Unpaid(triangle, options);

        Assert.InRange((total.Mean.Value - mack.ChainLadder.TotalReserve) / total.Mean.StandardError!.Value, -4, 4);
        // Four standard errors of the standard deviation, and a thousandth for the products that the closed form drops.
        double tolerance = (4 * total.Sd.StandardError!.Value) + (0.001 * total.Sd.Value);
        Assert.Equal(mack.Total.StandardError, total.Sd.Value, tolerance);
    }

    [Theory]
    [InlineData(ProcessError.Gamma)]
    [InlineData(ProcessError.Lognormal)]
    public void An_origin_of_zeros_stays_at_zero(ProcessError process)
    {
        Triangle triangle = Triangles.OfCumulative([100, 160, 180, 183], [110, 170, 195], [90, 150], [0]);

        var options = new ReservingOptions { Method = ReservingMethod.Mack, Process = process };

        OutcomeFigures total = TriangleRun.Unpaid(triangle, options);

        double reserve = Triangles.ChainLadder(triangle, options).TotalReserve;
        Assert.InRange((total.Mean.Value - reserve) / total.Mean.StandardError!.Value, -4, 4);
    }
}
