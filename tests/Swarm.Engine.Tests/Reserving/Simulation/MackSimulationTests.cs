using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Reserving.Simulation;

/// <summary>The simulation of Mack's model against his closed forms (Mack 1993, the triangle of Taylor &amp; Ashe 1983).</summary>
public sealed class MackSimulationTests
{
    private const long Trials = 1_000_000;

    // Mack (1993), ASTIN Bulletin 23(2): reserve 18,680,856 and its standard error 2,447,095.
    private const double Reserve = 18_680_856;
    private const double StandardError = 2_447_095;

    [Theory]
    [InlineData(ProcessError.Gamma)]
    [InlineData(ProcessError.Lognormal)]
    public void The_total_has_the_published_mean_and_standard_error(ProcessError process)
    {
        OutcomeFigures total = Run(process)["t.unpaid"];

        Assert.InRange((total.Mean.Value - Reserve) / total.Mean.StandardError!.Value, -4, 4);

        // The closed form drops products of estimation variances, which the simulation has: up to 0.5 % of the error here.
        Assert.Equal(1, total.Sd.Value / StandardError, 0.005);
    }

    [Theory]
    [InlineData(2, 75_535)]
    [InlineData(3, 121_699)]
    [InlineData(4, 133_549)]
    [InlineData(5, 261_406)]
    [InlineData(6, 411_010)]
    [InlineData(7, 558_317)]
    [InlineData(8, 875_328)]
    [InlineData(9, 971_258)]
    [InlineData(10, 1_363_155)]
    public void Origins_have_the_published_standard_errors(int origin, double published)
    {
        OutcomeFigures figures = Run(ProcessError.Gamma)[$"t.unpaid.{2000 + origin}"];

        Assert.Equal(1, figures.Sd.Value / published, 0.01);
    }

    private static readonly Dictionary<ProcessError, Dictionary<string, OutcomeFigures>> Runs = [];

    private static Dictionary<string, OutcomeFigures> Run(ProcessError process)
    {
        lock (Runs)
        {
            if (!Runs.TryGetValue(process, out Dictionary<string, OutcomeFigures>? figures))
            {
                var options = new ReservingOptions { Method = ReservingMethod.Mack, Process = process };
                Runs.Add(process, figures = TaylorAshe.Figures(options, Trials));
            }

            return figures;
        }
    }
}
