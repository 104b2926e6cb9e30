using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Numerics;

public class ElementaryAccuracyTests
{
    [Theory]
    [InlineData("exp", 1.0)]
    [InlineData("log", 1.0)]
    [InlineData("expm1", 1.0)]
    [InlineData("log1p", 1.0)]
    [InlineData("pow", 1.0)]
    [InlineData("normal-cdf", 5.0)]
    [InlineData("normal-quantile", 3.0)]
    public void Every_reference_value_is_met_within_the_stated_ulps(string name, double allowed)
    {
        var table = ReferenceTable.Read(name);

        var computed = LaneFunction.Named(name).Run(LaneWidth.Vector512, table.Arguments(0), table.Arguments(1));

        var (error, row) = table.Worst(computed);
        Assert.True(table.Count > 2000);
        Assert.True(error <= allowed, $"{name} is off by {error} ulp at {string.Join(", ", row)}");
    }

    [Theory]
    [InlineData("exp", -745.0, 709.7)]
    [InlineData("exp", -1.0, 1.0)]
    [InlineData("log", 1e-3, 1e3)]
    [InlineData("log", 0.5, 2.0)]
    public void A_dense_sweep_agrees_with_the_platform_within_2_ulp(string name, double low, double high)
    {
        const int Points = 200_000;
        Func<double, double> platform = name == "exp" ? Math.Exp : Math.Log;
        var x = new double[Points];
        for (var i = 0; i < Points; i++)
            x[i] = low + ((high - low) * (i + 0.5) / Points);

        var computed = LaneFunction.Named(name).Run(LaneWidth.Vector512, x, x);

        for (var i = 0; i < Points; i++)
        {
            var expected = platform(x[i]);
            var ulp = Math.BitIncrement(Math.Abs(expected)) - Math.Abs(expected);
            if (!(Math.Abs(computed[i] - expected) <= 2 * ulp))
                Assert.Fail($"{name}({x[i]:R}) = {computed[i]:R}, not {expected:R}");
        }
    }

    [Theory]
    [InlineData("exp", -745.2, 709.78)]
    [InlineData("log", 1e-300, 10.0)]
    [InlineData("normal-cdf", -38.5, 9.0)]
    [InlineData("normal-quantile", 1e-300, 1.0)]
    public void Rising_arguments_give_values_that_rise_but_for_rounding(string name, double low, double high)
    {
        const int Points = 100_000;
        var x = new double[Points];
        for (var i = 0; i < Points; i++)
            x[i] = low + ((high - low) * i / Points);

        var computed = LaneFunction.Named(name).Run(LaneWidth.Vector512, x, x);

        for (var i = 1; i < Points; i++)
        {
            var slack = 8 * (Math.BitIncrement(Math.Abs(computed[i])) - Math.Abs(computed[i]));
            if (!(computed[i] >= computed[i - 1] - slack))
                Assert.Fail($"{name} falls between {x[i - 1]:R} and {x[i]:R}");
        }
    }
}
