using CsCheck;
using Swarm.Engine.Numerics;

#pragma warning disable xUnit1025 // The analyzer takes -0 and 0 for duplicates; here they differ.
namespace Swarm.Engine.Tests.Numerics;

public class NormalFunctionsTests
{
    private const double Infinity = double.PositiveInfinity;

    [Theory]
    [InlineData(0.0, 0.5)]
    [InlineData(-0.0, 0.5)]
    [InlineData(-Infinity, 0.0)]
    [InlineData(Infinity, 1.0)]
    [InlineData(-40.0, 0.0)]
    [InlineData(40.0, 1.0)]
    [InlineData(double.MaxValue, 1.0)]
    [InlineData(double.MinValue, 0.0)]
    [InlineData(double.NaN, double.NaN)]
    public void The_distribution_function_at_its_edges(double x, double expected)
        => Assert.Equal(expected, NormalFunctions.Cdf(x));

    [Theory]
    [InlineData(0.0, -Infinity)]
    [InlineData(-0.0, -Infinity)]
    [InlineData(1.0, Infinity)]
    [InlineData(0.5, 0.0)]
    [InlineData(-double.Epsilon, double.NaN)]
    [InlineData(1.0000000000000002, double.NaN)]
    [InlineData(-0.0001, double.NaN)]
    [InlineData(2.0, double.NaN)]
    [InlineData(Infinity, double.NaN)]
    [InlineData(-Infinity, double.NaN)]
    [InlineData(double.NaN, double.NaN)]
    [InlineData(double.Epsilon, -38.467405617144344)]
    public void The_quantile_at_its_edges(double u, double expected)
        => Assert.Equal(expected, NormalFunctions.Quantile(u));

    // Published to more digits in Abramowitz & Stegun (1964), table 26.1 and 26.5.
    [Theory]
    [InlineData(1.0, 0.8413447460685429)]
    [InlineData(2.0, 0.9772498680518208)]
    [InlineData(-3.0, 0.0013498980316300945)]
    public void The_distribution_function_agrees_with_the_printed_tables(double x, double expected)
        => Assert.Equal(expected, NormalFunctions.Cdf(x), expected * 1e-15);

    [Fact]
    public void The_quantile_is_antisymmetric_to_the_bit_on_the_lattice_of_the_streams()
        => Gen.Long[0, (1L << 52) - 1].Sample(
            k =>
            {
                var u = ((2 * k) + 1) * 1.1102230246251565e-16;
                return NormalFunctions.Quantile(u) == -NormalFunctions.Quantile(1 - u);
            },
            seed: "0000000000000001",
            iter: 20_000);

    [Fact]
    public void The_distribution_function_undoes_the_quantile()
        => Gen.Double[-36.0, 0.0].Sample(
            logOfU =>
            {
                var u = Math.Pow(10, logOfU / 36 * 300);
                var back = NormalFunctions.Cdf(NormalFunctions.Quantile(u));

                // An error of 3 ulp in z is one of 3 z^2 ulp in u.
                var z = NormalFunctions.Quantile(u);
                return Math.Abs(back - u) <= u * 2.3e-16 * (8 + (4 * z * z));
            },
            seed: "0000000000000001",
            iter: 20_000);
}
