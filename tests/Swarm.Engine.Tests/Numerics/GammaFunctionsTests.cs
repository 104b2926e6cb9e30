using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Numerics;

public class GammaFunctionsTests
{
    [Fact]
    public void The_logarithm_of_gamma_meets_every_reference_value_within_6_ulp()
    {
        var table = ReferenceTable.Read("log-gamma");

        var (error, row) = table.Worst([.. table.Arguments(0).Select(GammaFunctions.LogGamma)]);

        Assert.True(error <= 6, $"off by {error} ulp at {string.Join(", ", row)}");
    }

    [Theory]
    [InlineData(1.0, 0.0)]
    [InlineData(2.0, 0.0)]
    [InlineData(0.0, double.PositiveInfinity)]
    [InlineData(double.PositiveInfinity, double.PositiveInfinity)]
    [InlineData(-0.5, double.NaN)]
    [InlineData(double.NaN, double.NaN)]
    public void The_logarithm_of_gamma_at_its_edges(double x, double expected)
        => Assert.Equal(expected, GammaFunctions.LogGamma(x));

    [Fact]
    public void The_incomplete_gamma_functions_meet_every_reference_value()
    {
        var lower = ReferenceTable.Read("gamma-lower");
        var upper = ReferenceTable.Read("gamma-upper");

        AssertClose(lower, GammaFunctions.RegularisedLower);
        AssertClose(upper, GammaFunctions.RegularisedUpper);
    }

    [Theory]
    [InlineData(2.0, 0.0, 0.0)]
    [InlineData(2.0, -1.0, 0.0)]
    [InlineData(2.0, double.PositiveInfinity, 1.0)]
    [InlineData(0.0, 1.0, double.NaN)]
    [InlineData(1.0, double.NaN, double.NaN)]
    public void The_incomplete_gamma_function_at_its_edges(double a, double x, double expected)
    {
        Assert.Equal(expected, GammaFunctions.RegularisedLower(a, x));
        Assert.Equal(1 - expected, GammaFunctions.RegularisedUpper(a, x));
    }

    private static void AssertClose(ReferenceTable table, Func<double, double, double> function)
    {
        var (a, x) = (table.Arguments(0), table.Arguments(1));
        for (var i = 0; i < table.Count; i++)
        {
            var expected = table.Rounded(i);
            var actual = function(a[i], x[i]);
            Assert.True(Math.Abs(actual - expected) <= 1e-12 * expected, $"({a[i]:R}, {x[i]:R}): {actual:R}, not {expected:R}");
        }
    }
}
