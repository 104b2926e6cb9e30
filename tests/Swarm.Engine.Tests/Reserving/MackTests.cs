using Swarm.Engine.Reserving;
using static Swarm.Engine.Tests.Reserving.ReferenceValues;

namespace Swarm.Engine.Tests.Reserving;

public sealed class MackTests
{
    private const string Part = "chain_ladder_mack";

    public static TheoryData<string> Published => [.. Triangles.Published];

    [Theory]
    [MemberData(nameof(Published))]
    public void Factors_and_reserves_are_those_of_Mack_1993(string name)
    {
        ChainLadder fit = Triangles.ChainLadder(Triangles.Load(name));
        IEnumerable<int> origins = Enumerable.Range(0, fit.Triangle.Origins.Count);

        AssertClose(List(name, Part, "development_factors"), fit.Factors, 1e-12);
        AssertClose(List(name, Part, "ultimate_by_origin"), origins.Select(fit.Ultimate), 1e-12);
        AssertClose(List(name, Part, "reserve_by_origin"), origins.Select(fit.Reserve), 1e-10, 1e-6);
        AssertClose(One(name, Part, "reserve_total"), fit.TotalReserve, 1e-12);
    }

    [Theory]
    [MemberData(nameof(Published))]
    public void Standard_errors_and_their_parts_are_those_of_Mack_1993(string name)
    {
        Mack mack = Triangles.Mack(Triangles.Load(name));
        PredictionError[] origins = [.. Enumerable.Range(0, mack.Triangle.Origins.Count).Select(mack.Origin)];

        AssertClose(List(name, Part, "sigma_squared"), mack.SigmaSquared, 1e-10);
        AssertClose(List(name, Part, "mack_se_by_origin"), origins.Select(e => e.StandardError), 1e-9);
        AssertClose(List(name, Part, "mack_process_se_by_origin"), origins.Select(e => e.Process), 1e-9);
        AssertClose(List(name, Part, "mack_parameter_se_by_origin"), origins.Select(e => e.Parameter), 1e-9);
        AssertClose(One(name, Part, "mack_se_total"), mack.Total.StandardError, 1e-9);
        AssertClose(One(name, Part, "mack_process_se_total"), mack.Total.Process, 1e-9);
        AssertClose(One(name, Part, "mack_parameter_se_total"), mack.Total.Parameter, 1e-9);
    }

    [Theory]
    [MemberData(nameof(Published))]
    public void Lognormal_quantiles_have_the_reserve_and_its_error_as_moments(string name)
    {
        Mack mack = Triangles.Mack(Triangles.Load(name));

        foreach ((string level, double value) in Of(name, Part, "mack_lognormal_quantiles_total"))
        {
            AssertClose(value, mack.LognormalQuantile(double.Parse(level)), 1e-9);
        }
    }

    [Fact]
    public void Taylor_and_Ashe_comes_out_as_Mack_printed_it()
    {
        Mack mack = Triangles.Mack(Triangles.Load("taylor-ashe"));
        const string Name = "taylor-ashe";
        const string Printed = "chain_ladder_mack.published";

        Assert.Equal(18_680_856, Math.Round(mack.ChainLadder.TotalReserve));
        Assert.Equal(One(Name, Printed, "mack_se_total"), Math.Round(mack.Total.StandardError));
        Assert.Equal(
            List(Name, Printed, "reserve_by_origin"),
            Enumerable.Range(0, 10).Select(i => Math.Round(mack.ChainLadder.Reserve(i))));
        Assert.Equal(
            List(Name, Printed, "mack_se_by_origin"),
            Enumerable.Range(0, 10).Select(i => Math.Round(mack.Origin(i).StandardError)));
    }

    // Mack (1994), "Measuring the variability of chain ladder reserve estimates", Casualty Actuarial Society: reserve 52,135 and
    // standard error 26,909, from memory.
    [Fact]
    public void The_triangle_of_Mack_1994_comes_out_as_printed()
    {
        Mack mack = Triangles.Mack(Triangles.Load("mack1994"));

        Assert.Equal(52_135, Math.Round(mack.ChainLadder.TotalReserve));
        Assert.Equal(26_909, Math.Round(mack.Total.StandardError));
    }

    [Fact]
    public void A_simple_average_weights_all_link_ratios_alike()
    {
        Mack mack = Triangles.Mack(
            Triangles.OfCumulative([100, 200, 220], [300, 450], [200]), new ReservingOptions { Average = LinkRatioAverage.Simple });

        // By hand: (2 + 1.5) / 2, and the variance of the two ratios with n - 1; its error is the root of variance / 2.
        Assert.Equal(1.75, mack.Factors[0]);
        Assert.Equal(0.125, mack.SigmaSquared[0], 1e-15);
        Assert.Equal(0.25, mack.FactorErrors[0], 1e-15);
        // Alpha = 0: variance C^2 sigma^2 a period, so that of the youngest origin is 200^2 0.125 1.1^2 + 350^2 0.125.
        Assert.Equal((40_000 * 0.125 * 1.21) + (122_500 * 0.125), Squared(mack.Origin(2).Process), 1e-8);
    }

    [Fact]
    public void A_tail_adds_its_errors_to_every_origin()
    {
        Triangle triangle = Triangles.Load("taylor-ashe");
        Mack bare = Triangles.Mack(triangle);
        Mack tailed = Triangles.Mack(triangle, new ReservingOptions { Tail = new TailOptions { Factor = 1.05, Sd = 0.02 } });

        // Mack (1999): 1.05 lies between the factors 1.0539 and 1.0766 or 1.0177, so its sigma lies between theirs.
        double sigmaSquared = tailed.SigmaSquared[^1];
        Assert.InRange(sigmaSquared, bare.SigmaSquared[8], bare.SigmaSquared[7]);
        double oldest = triangle.Latest(0);
        AssertClose(oldest * sigmaSquared, Squared(tailed.Origin(0).Process), 1e-12);
        AssertClose(oldest * 0.02, tailed.Origin(0).Parameter, 1e-12);
        double grown = (Squared(bare.Origin(4).Parameter) * 1.05 * 1.05) + Squared(bare.ChainLadder.Ultimate(4) * 0.02);
        AssertClose(grown, Squared(tailed.Origin(4).Parameter), 1e-12);
    }

    [Fact]
    public void A_tail_factor_below_all_others_takes_the_minimum_rule_one_period_on()
    {
        Mack mack = Triangles.Mack(
            Triangles.Load("taylor-ashe"), new ReservingOptions { Tail = new TailOptions { Factor = 1.001 } });

        double last = mack.SigmaSquared[8];
        double before = mack.SigmaSquared[7];
        Assert.Equal(Math.Min(last * last / before, Math.Min(last, before)), mack.SigmaSquared[9]);
    }

    private static double Squared(double x) => x * x;
}
