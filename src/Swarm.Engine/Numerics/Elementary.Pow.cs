using System.Runtime.CompilerServices;
using static Swarm.Engine.Numerics.Polynomial;

namespace Swarm.Engine.Numerics;

internal static partial class Elementary
{
    // ln 2 in two parts: the first has 42 bits, so that its product with an exponent is exact.
    private const double Ln2Short = 0.6931471805598903;
    private const double Ln2ShortRest = 5.497923018708371e-14;

    /// <summary>
    /// x to the power y as IEEE 754-2019 pow, within 1 ulp: pow(x, 0) = 1 and pow(1, y) = 1 even for NaN; a negative base needs
    /// an integer exponent, else NaN; pow(-1, +-inf) = 1; zeros and infinities carry the sign of odd powers.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Pow<V>(V x, V y)
        where V : unmanaged, ILanes<V>
        => LaneMath.AnyOutsidePositiveNormals(x) || V.Any(V.SubtractIntegers(V.CreateBits(LaneMath.MaxFiniteBits), V.Abs(y)))
            ? PowAnywhere(x, y)
            : PowOfNormal(x, y, 0.0);

    /// <summary>(x * 2^-scale)^y for a positive normal x and a finite y: exp of y times a double-double logarithm.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V PowOfNormal<V>(V x, V y, double scale)
        where V : unmanaged, ILanes<V>
    {
        var logarithm = LogInTwoParts(x, scale, out var logarithmLow);
        var high = y * logarithm;
        var low = V.FusedMultiplyAdd(y, logarithmLow, V.FusedMultiplyAdd(y, logarithm, -high));
        var far = ~V.LessThanOrEqual(V.Abs(high), V.Create(800.0));
        high = V.Select(far, LaneMath.CopySign(V.Create(800.0), high), high);
        low = V.Select(far, V.Create(0.0), low);
        return ExpOfSum(high, low, V.Create(1.0));
    }

    /// <summary>The logarithm of x * 2^-scale as an unevaluated sum with a relative error near 2^-65.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V LogInTwoParts<V>(V x, double scale, out V low)
        where V : unmanaged, ILanes<V>
    {
        const double TwoThirds = 0.6666666666666666;
        const double TwoThirdsLow = 3.700743415417188e-17;
        var m = SplitNormal(x, out var exponent);
        var k = exponent - V.Create(TwoTo52 + 1023.0 + scale);

        // s + sLow = (m - 1) / (m + 1), and its square z + zLow.
        var one = V.Create(1.0);
        var f = m - one;
        var g = m + one;
        var gLow = m - (g - one);
        var s = f / g;
        var sLow = V.FusedMultiplyAdd(-s, gLow, V.FusedMultiplyAdd(-s, g, f)) / g;
        var z = s * s;
        var zLow = V.FusedMultiplyAdd(s + s, sLow, V.FusedMultiplyAdd(s, s, -z));

        // log m = 2 s + s z q, q = 2/3 + z (2/5 + ...).
        var series = PowSeries(z);
        var product = z * series;
        var q = V.Create(TwoThirds) + product;
        var qLow = ((V.Create(TwoThirds) - q) + product) + V.FusedMultiplyAdd(zLow, series, V.Create(TwoThirdsLow));
        var zq = z * q;
        var zqLow = V.FusedMultiplyAdd(z, qLow, V.FusedMultiplyAdd(zLow, q, V.FusedMultiplyAdd(z, q, -zq)));
        var cube = s * zq;
        var cubeLow = V.FusedMultiplyAdd(s, zqLow, V.FusedMultiplyAdd(sLow, zq, V.FusedMultiplyAdd(s, zq, -cube)));
        var twice = s + s;
        var sum = twice + cube;
        var sumLow = ((twice - sum) + cube) + (cubeLow + (sLow + sLow));

        // Add k ln 2; its first part is exact and, where k is not 0, larger than the rest.
        var whole = k * V.Create(Ln2Short);
        var total = whole + sum;
        var totalLow = ((whole - total) + sum) + V.FusedMultiplyAdd(k, V.Create(Ln2ShortRest), sumLow);
        var high = total + totalLow;
        low = (total - high) + totalLow;
        return high;
    }

    /// <summary>2/5 + 2/7 z + ...: minimax, relative error of the logarithm below 2^-73.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V PowSeries<V>(V z)
        where V : unmanaged, ILanes<V>
    {
        var z2 = z * z;
        var z4 = z2 * z2;
        return Four(z, z2, 0.15384556646748745, 0.1333632611523353, 0.11674641054830442, 0.11990496200895435)
            .Over(z4, Four(z, z2, 0.3999999999999998, 0.2857142857144522, 0.2222222221751049, 0.18181818873561895));
    }

    /// <summary>Any base and exponent.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V PowAnywhere<V>(V x, V y)
        where V : unmanaged, ILanes<V>
    {
        var zero = V.Create(0.0);
        var one = V.Create(1.0);
        var infinity = V.Create(double.PositiveInfinity);
        var size = V.Abs(x);
        var subnormal = V.LessThan(size, V.Create(MinNormal));
        var result = V.Select(
            subnormal,
            PowOfNormal(size * V.Create(TwoTo54), y, 54.0),
            PowOfNormal(size, y, 0.0));

        // A base of 0 or infinity, or an infinite exponent, leaves 0, 1 or infinity.
        var extreme = V.EqualTo(size, zero) | V.EqualTo(size, infinity) | V.EqualTo(V.Abs(y), infinity);
        var grows = ~(V.LessThan(size, one) ^ V.LessThan(y, zero));
        result = V.Select(extreme, V.Select(grows, infinity, zero), result);
        result = V.Select(V.EqualTo(size, one), one, result);

        var whole = V.EqualTo(V.Floor(y), y);
        var halfOfY = y * V.Create(0.5);
        var odd = whole & ~V.EqualTo(V.Floor(halfOfY), halfOfY);
        result = result ^ (x & odd & V.CreateBits(LaneMath.SignBit));
        var noReal = V.LessThan(x, zero) & ~whole & ~V.EqualTo(size, infinity);
        result = V.Select(noReal | LaneMath.IsNaN(x) | LaneMath.IsNaN(y), LaneMath.NaN<V>(), result);
        return V.Select(V.EqualTo(y, zero) | V.EqualTo(x, one), one, result);
    }
}
