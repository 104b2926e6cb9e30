using System.Runtime.CompilerServices;
using static Swarm.Engine.Numerics.Polynomial;

namespace Swarm.Engine.Numerics;

internal static partial class Elementary
{
    private const ulong RootHalfBits = 0x3FE6_A09E_667F_3BCD;
    private const ulong MantissaMask = 0x000F_FFFF_FFFF_FFFF;
    private const double TwoTo52 = 4503599627370496.0;
    private const ulong TwoTo52Bits = 0x4330_0000_0000_0000;
    private const double TwoTo54 = 18014398509481984.0;
    private const double MinNormal = 2.2250738585072014e-308;

    /// <summary>
    /// Natural logarithm, within 1 ulp, of subnormals too. log(+-0) = -inf, log(+inf) = +inf, NaN below zero. The form is that
    /// of Tang (1990) without a table: log m = f - f^2/2 + s (f^2/2 + R(s^2)), f = m - 1, s = f / (2 + f).
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Log<V>(V x)
        where V : unmanaged, ILanes<V>
        => LaneMath.AnyOutsidePositiveNormals(x) ? LogAnywhere(x) : LogOfNormal(x, TwoTo52 + 1023.0);

    /// <summary>The logarithm of a positive normal number, times 2^(1023 - offset + 2^52).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V LogOfNormal<V>(V x, double offset)
        where V : unmanaged, ILanes<V>
    {
        var m = SplitNormal(x, out var exponent);
        var k = exponent - V.Create(offset);
        var f = m - V.Create(1.0);
        return LogOfParts(k, f, k * V.Create(Ln2Low));
    }

    /// <summary>x = m * 2^k with m in [sqrt(1/2), sqrt(2)); the exponent comes as 2^52 + 1023 + k.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V SplitNormal<V>(V x, out V exponent)
        where V : unmanaged, ILanes<V>
    {
        var moved = V.AddIntegers(x, V.CreateBits(OneBits - RootHalfBits));
        exponent = V.ShiftRight(moved, 52) | V.CreateBits(TwoTo52Bits);
        return V.AddIntegers(moved & V.CreateBits(MantissaMask), V.CreateBits(RootHalfBits));
    }

    /// <summary>k ln 2 + log(1 + f) + small, for f in [sqrt(1/2) - 1, sqrt(2) - 1).</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V LogOfParts<V>(V k, V f, V small)
        where V : unmanaged, ILanes<V>
    {
        var s = f / (f + V.Create(2.0));
        var halfSquare = f * V.Create(0.5) * f;
        var z = s * s;
        var rest = V.FusedMultiplyAdd(s, V.FusedMultiplyAdd(LogSeries(z), z, halfSquare), small);
        return V.FusedMultiplyAdd(k, V.Create(Ln2), f - (halfSquare - rest));
    }

    /// <summary>(log((1 + s) / (1 - s)) - 2 s) / s^3 in z = s^2: minimax, relative error of the logarithm below 2^-59.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V LogSeries<V>(V z)
        where V : unmanaged, ILanes<V>
    {
        var z2 = z * z;
        var z4 = z2 * z2;
        return Three(z, z2, 0.18183569820607617, 0.15313901097975893, 0.1479752973791556)
            .Over(z4, Four(z, z2, 0.6666666666666735, 0.3999999999941106, 0.28571428743274635, 0.2222219847453862));
    }

    /// <summary>
    /// log(4 x) for a positive normal number, with an absolute error near 2^-53 rather than a relative one: enough for
    /// <see cref="NormalFunctions"/>, and shorter.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static V LogOfFourfold<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        var m = SplitNormal(x, out var exponent);
        var k = exponent - V.Create(TwoTo52 + 1023.0 - 2.0);
        var s = (m - V.Create(1.0)) / (m + V.Create(1.0));
        var z = s * s;
        var z2 = z * z;
        var series = Three(z, z2, 0.22223375231298306, 0.18123521703051193, 0.1682134081311993)
            .Over(z2 * z2, Four(z, z2, 2.0, 0.6666666666658673, 0.40000000052539725, 0.2857141708298968));
        return V.FusedMultiplyAdd(k, V.Create(Ln2), s * series);
    }

    /// <summary>Any x: zeros, negatives, subnormals, infinities, NaN.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V LogAnywhere<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        var subnormal = V.LessThan(x, V.Create(MinNormal));
        var result = V.Select(
            subnormal,
            LogOfNormal(x * V.Create(TwoTo54), TwoTo52 + 1023.0 + 54.0),
            LogOfNormal(x, TwoTo52 + 1023.0));
        return WithLogEdges(x, x, result);
    }

    /// <summary>The edges of the logarithm of y, seen from its argument.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V WithLogEdges<V>(V x, V y, V result)
        where V : unmanaged, ILanes<V>
    {
        var infinity = V.Create(double.PositiveInfinity);
        result = V.Select(V.EqualTo(y, infinity), infinity, result);
        result = V.Select(V.EqualTo(y, V.Create(0.0)), V.Create(double.NegativeInfinity), result);
        return V.Select(V.LessThan(y, V.Create(0.0)) | LaneMath.IsNaN(x), LaneMath.NaN<V>(), result);
    }

    /// <summary>
    /// log(1 + x) without cancellation, within 1 ulp. log1p(-1) = -inf, log1p(+inf) = +inf, log1p(+-0) = +-0, NaN below -1.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Log1p<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        const double Tiny = 5.551115123125783e-17; // 2^-54
        const double TwoTo60 = 1152921504606846976.0;

        // 1 + x = sum + lost exactly (Knuth's two-sum).
        var one = V.Create(1.0);
        var sum = one + x;
        var back = sum - one;
        var lost = (one - (sum - back)) + (x - back);
        var m = SplitNormal(sum, out var exponent);
        var k = exponent - V.Create(TwoTo52 + 1023.0);
        var scaledLost = lost * V.ShiftLeft(V.SubtractIntegers(V.CreateBits(2046), exponent), 52);

        // Above 2^60 nothing worth keeping is lost, and the scale would leave the exponents.
        scaledLost &= V.LessThan(x, V.Create(TwoTo60));
        var f0 = m - one;
        var f = f0 + scaledLost;
        var dropped = (f0 - f) + scaledLost;
        var small = V.FusedMultiplyAdd(k, V.Create(Ln2Low), V.FusedMultiplyAdd(-dropped, f, dropped));
        var result = LogOfParts(k, f, small);
        result = V.Select(V.LessThan(V.Abs(x), V.Create(Tiny)), x, result);
        return LaneMath.AnyOutsidePositiveNormals(sum) ? WithLogEdges(x, sum, result) : result;
    }
}
