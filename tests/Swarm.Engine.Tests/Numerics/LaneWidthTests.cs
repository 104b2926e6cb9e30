using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Numerics;

public class LaneWidthTests
{
    private static readonly double[] Special =
    [
        0.0, -0.0, 1.0, -1.0, 0.5, -0.5, 2.0, -2.0, 3.0, -3.0, 1e300, -1e300, double.Epsilon, -double.Epsilon,
        double.MaxValue, double.MinValue, double.PositiveInfinity, double.NegativeInfinity, double.NaN, -double.NaN,
        BitConverter.UInt64BitsToDouble(0x7FF0_0000_0000_0001), BitConverter.UInt64BitsToDouble(0xFFFF_FFFF_FFFF_FFFF),
        2.2250738585072014e-308, 2.225073858507201e-308, 708.0, 709.782712893384, 709.79, 710.0, -708.4, -745.1, -745.2, -746.0,
        Math.BitDecrement(1.0), Math.BitIncrement(1.0), 1.1102230246251565e-16, 5.551115123125783e-17, 0.0007956951991274167,
        Math.BitDecrement(0.0007956951991274167), 9007199254740991.0, 9007199254740992.0, 9007199254740993.0, 1e17,
    ];

    public static TheoryData<string> Functions => [.. LaneFunction.All.Select(f => f.ToString())];

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_width_gives_the_same_bits_for_every_pair_of_special_values(string name)
    {
        var x = (from a in Special from b in Special select a).ToArray();
        var y = (from a in Special from b in Special select b).ToArray();

        AssertEqualBits(name, x, y);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_width_gives_the_same_bits_for_random_bit_patterns(string name)
    {
        var random = new Random(1);
        var x = new double[40_000];
        var y = new double[x.Length];
        for (var i = 0; i < x.Length; i++)
        {
            x[i] = BitConverter.Int64BitsToDouble(random.NextInt64(long.MinValue, long.MaxValue));
            y[i] = BitConverter.Int64BitsToDouble(random.NextInt64(long.MinValue, long.MaxValue));
        }

        AssertEqualBits(name, x, y);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_width_gives_the_same_bits_where_models_live(string name)
    {
        var random = new Random(2);
        var x = new double[40_000];
        var y = new double[x.Length];
        for (var i = 0; i < x.Length; i++)
        {
            x[i] = i % 2 == 0 ? random.NextDouble() : (random.NextDouble() - 0.3) * 100;
            y[i] = i % 3 == 0 ? random.Next(-9, 9) : (random.NextDouble() - 0.5) * 20;
        }

        AssertEqualBits(name, x, y);
    }

    [Theory]
    [MemberData(nameof(Functions))]
    public void Every_NaN_result_is_the_canonical_one(string name)
    {
        var x = (from a in Special from b in Special select a).ToArray();
        var y = (from a in Special from b in Special select b).ToArray();

        var nans = LaneFunction.Named(name).Run(LaneWidth.Vector512, x, y).Where(double.IsNaN).ToArray();

        Assert.NotEmpty(nans);
        Assert.All(nans, value => Assert.Equal(LaneMath.NaNBits, BitConverter.DoubleToUInt64Bits(value)));
    }

    [Fact]
    public void The_quantile_of_an_open_uniform_is_the_quantile_to_the_bit()
    {
        var random = new Random(3);
        for (var i = 0; i < 20_000; i++)
        {
            var k = i % 4 == 0 ? random.NextInt64(1L << (i % 52)) : random.NextInt64(1L << 52);
            var u = Lanes64.Create(((2 * k) + 1) * 1.1102230246251565e-16);

            Assert.Equal(NormalFunctions.Quantile(u).Value, NormalFunctions.QuantileOfOpenUniform(u).Value);
        }
    }

    private static void AssertEqualBits(string name, double[] x, double[] y)
    {
        var function = LaneFunction.Named(name);
        var scalar = function.Run(LaneWidth.Scalar, x, y);
        foreach (var width in new[] { LaneWidth.Vector128, LaneWidth.Vector256, LaneWidth.Vector512 })
        {
            var vector = function.Run(width, x, y);
            for (var i = 0; i < x.Length; i++)
            {
                if (BitConverter.DoubleToUInt64Bits(scalar[i]) != BitConverter.DoubleToUInt64Bits(vector[i]))
                    Assert.Fail($"{name}({x[i]:R}, {y[i]:R}) is {scalar[i]:R} alone and {vector[i]:R} at {width}");
            }
        }
    }
}
