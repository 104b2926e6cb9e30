using Swarm.Engine.Numerics;

#pragma warning disable xUnit1025 // The analyzer takes -0 and 0 for duplicates; here they differ.
namespace Swarm.Engine.Tests.Numerics;

public class ElementaryEdgeTests
{
    private const double Infinity = double.PositiveInfinity;
    private const double NaN = double.NaN;
    private const double MinusZero = -0.0;

    [Theory]
    [InlineData(0.0, 1.0)]
    [InlineData(MinusZero, 1.0)]
    [InlineData(-Infinity, 0.0)]
    [InlineData(Infinity, Infinity)]
    [InlineData(NaN, NaN)]
    [InlineData(709.7827128933841, Infinity)]
    [InlineData(-745.1332191019411, double.Epsilon)]
    [InlineData(-745.1332191019412, 0.0)]
    [InlineData(double.MaxValue, Infinity)]
    [InlineData(double.MinValue, 0.0)]
    [InlineData(double.Epsilon, 1.0)]
    public void Exp_at_its_edges(double x, double expected) => AssertSame(expected, Elementary.Exp(x));

    [Theory]
    [InlineData(0.0, -Infinity)]
    [InlineData(MinusZero, -Infinity)]
    [InlineData(1.0, 0.0)]
    [InlineData(Infinity, Infinity)]
    [InlineData(-Infinity, NaN)]
    [InlineData(-1.0, NaN)]
    [InlineData(-double.Epsilon, NaN)]
    [InlineData(NaN, NaN)]
    [InlineData(double.Epsilon, -744.4400719213812)]
    [InlineData(double.MaxValue, 709.782712893384)]
    public void Log_at_its_edges(double x, double expected) => AssertSame(expected, Elementary.Log(x));

    [Theory]
    [InlineData(0.0, 0.0)]
    [InlineData(MinusZero, MinusZero)]
    [InlineData(double.Epsilon, double.Epsilon)]
    [InlineData(-double.Epsilon, -double.Epsilon)]
    [InlineData(-Infinity, -1.0)]
    [InlineData(-1e9, -1.0)]
    [InlineData(Infinity, Infinity)]
    [InlineData(710.0, Infinity)]
    [InlineData(NaN, NaN)]
    public void Expm1_at_its_edges(double x, double expected) => AssertSame(expected, Elementary.Expm1(x));

    [Theory]
    [InlineData(0.0, 0.0)]
    [InlineData(MinusZero, MinusZero)]
    [InlineData(double.Epsilon, double.Epsilon)]
    [InlineData(-1.0, -Infinity)]
    [InlineData(-1.0000000000000002, NaN)]
    [InlineData(-Infinity, NaN)]
    [InlineData(Infinity, Infinity)]
    [InlineData(NaN, NaN)]
    [InlineData(double.MaxValue, 709.782712893384)]
    public void Log1p_at_its_edges(double x, double expected) => AssertSame(expected, Elementary.Log1p(x));

    // The list of IEEE 754-2019, section 9.2.1.
    [Theory]
    [InlineData(NaN, 0.0, 1.0)]
    [InlineData(NaN, MinusZero, 1.0)]
    [InlineData(Infinity, 0.0, 1.0)]
    [InlineData(-7.0, 0.0, 1.0)]
    [InlineData(1.0, NaN, 1.0)]
    [InlineData(1.0, Infinity, 1.0)]
    [InlineData(-1.0, Infinity, 1.0)]
    [InlineData(-1.0, -Infinity, 1.0)]
    [InlineData(0.0, -3.0, Infinity)]
    [InlineData(MinusZero, -3.0, -Infinity)]
    [InlineData(MinusZero, -2.0, Infinity)]
    [InlineData(MinusZero, -2.5, Infinity)]
    [InlineData(0.0, -Infinity, Infinity)]
    [InlineData(MinusZero, -Infinity, Infinity)]
    [InlineData(0.0, 3.0, 0.0)]
    [InlineData(MinusZero, 3.0, MinusZero)]
    [InlineData(MinusZero, 2.0, 0.0)]
    [InlineData(MinusZero, 0.5, 0.0)]
    [InlineData(0.5, Infinity, 0.0)]
    [InlineData(-0.5, Infinity, 0.0)]
    [InlineData(2.0, Infinity, Infinity)]
    [InlineData(0.5, -Infinity, Infinity)]
    [InlineData(2.0, -Infinity, 0.0)]
    [InlineData(Infinity, 0.5, Infinity)]
    [InlineData(Infinity, -0.5, 0.0)]
    [InlineData(-Infinity, 3.0, -Infinity)]
    [InlineData(-Infinity, 2.0, Infinity)]
    [InlineData(-Infinity, 0.5, Infinity)]
    [InlineData(-Infinity, -3.0, MinusZero)]
    [InlineData(-Infinity, -2.0, 0.0)]
    [InlineData(-2.0, 3.0, -8.0)]
    [InlineData(-2.0, -2.0, 0.25)]
    [InlineData(-2.0, 0.5, NaN)]
    [InlineData(-0.1, Infinity, 0.0)]
    [InlineData(NaN, 1.0, NaN)]
    [InlineData(2.0, NaN, NaN)]
    [InlineData(2.0, 1024.0, Infinity)]
    [InlineData(-2.0, 1025.0, -Infinity)]
    [InlineData(2.0, -1074.0, double.Epsilon)]
    [InlineData(2.0, -1076.0, 0.0)]
    [InlineData(-2.0, -1077.0, MinusZero)]
    [InlineData(double.Epsilon, 1.0, double.Epsilon)]
    [InlineData(-double.Epsilon, 1.0, -double.Epsilon)]
    [InlineData(-1.0, 9007199254740991.0, -1.0)]
    [InlineData(-1.0, 9007199254740992.0, 1.0)]
    [InlineData(10.0, 300.0, 1e300)]
    [InlineData(1.5, 1e300, Infinity)]
    [InlineData(1.5, -1e300, 0.0)]
    [InlineData(double.MaxValue, double.MaxValue, Infinity)]
    public void Pow_at_its_edges(double x, double y, double expected) => AssertSame(expected, Elementary.Pow(x, y));

    [Fact]
    public void Whole_powers_of_small_whole_numbers_are_exact()
    {
        for (var x = 1; x <= 20; x++)
        {
            var exact = 1.0;
            for (var y = 0; exact <= 1e15; y++, exact *= x)
            {
                AssertSame(exact, Elementary.Pow(x, y));
                if (x == 1 && y > 3)
                    break;
            }
        }
    }

    [Fact]
    public void The_first_power_is_the_number()
    {
        var random = new Random(4);
        for (var i = 0; i < 20_000; i++)
        {
            var x = BitConverter.Int64BitsToDouble(random.NextInt64(1, 0x7FF0_0000_0000_0000));
            AssertSame(x, Elementary.Pow(x, 1.0));
        }
    }

    [Theory]
    [InlineData(0.0, MinusZero, MinusZero, 0.0)]
    [InlineData(MinusZero, 0.0, MinusZero, 0.0)]
    [InlineData(1.0, NaN, NaN, NaN)]
    [InlineData(NaN, 1.0, NaN, NaN)]
    [InlineData(-Infinity, Infinity, -Infinity, Infinity)]
    [InlineData(-3.0, 2.0, -3.0, 2.0)]
    [InlineData(2.0, -3.0, -3.0, 2.0)]
    [InlineData(-3.0, -3.0, -3.0, -3.0)]
    public void Min_and_max_order_zeros_and_pass_NaN_on(double a, double b, double least, double most)
    {
        AssertSame(least, LaneMath.Min(Lanes64.Create(a), Lanes64.Create(b)).Value);
        AssertSame(most, LaneMath.Max(Lanes64.Create(a), Lanes64.Create(b)).Value);
    }

    /// <summary>Equal bits; all NaN count as the canonical one.</summary>
    private static void AssertSame(double expected, double actual)
    {
        var bits = double.IsNaN(expected) ? LaneMath.NaNBits : BitConverter.DoubleToUInt64Bits(expected);
        if (bits != BitConverter.DoubleToUInt64Bits(actual))
            Assert.Fail($"expected {expected:R}, not {actual:R}");
    }
}
