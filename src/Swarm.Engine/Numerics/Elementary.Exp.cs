using System.Runtime.CompilerServices;
using static Swarm.Engine.Numerics.Polynomial;

namespace Swarm.Engine.Numerics;

internal static partial class Elementary
{
    private const double Log2E = 1.4426950408889634;
    private const double Ln2 = 0.6931471805599453;
    private const double Ln2Low = 2.3190468138462996e-17;

    // Adding 1.5 * 2^52 rounds to an integer (ties to even) that then stands in the low bits.
    private const double RoundingShift = 6755399441055744.0;
    private const ulong OneBits = 0x3FF0_0000_0000_0000;

    /// <summary>
    /// e^x, within 1 ulp; subnormal results within 1 of their ulps. exp(-inf) = 0, exp(+inf) = +inf, exp(+-0) = 1.
    /// Overflows to +inf above 709.78, to 0 below -745.13.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Exp<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        const ulong BitsOf708 = 0x4086_2000_0000_0000;
        var shifted = V.FusedMultiplyAdd(x, V.Create(Log2E), V.Create(RoundingShift));
        var k = shifted - V.Create(RoundingShift);
        var r = V.FusedMultiplyAdd(k, V.Create(-Ln2), x);
        r = V.FusedMultiplyAdd(k, V.Create(-Ln2Low), r);
        var mantissa = ExpOfReduced(r);
        var result = V.AddIntegers(mantissa, V.ShiftLeft(shifted, 52));
        return V.Any(V.SubtractIntegers(V.CreateBits(BitsOf708), V.Abs(x))) ? ExpAnywhere(x) : result;
    }

    /// <summary>Any x: NaN, infinities, results that overflow or are subnormal.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V ExpAnywhere<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        var clamped = V.Select(V.LessThan(V.Create(710.0), x), V.Create(710.0), x);
        clamped = V.Select(V.LessThan(clamped, V.Create(-746.0)), V.Create(-746.0), clamped);
        var shifted = V.FusedMultiplyAdd(clamped, V.Create(Log2E), V.Create(RoundingShift));
        var k = shifted - V.Create(RoundingShift);
        var r = V.FusedMultiplyAdd(k, V.Create(-Ln2), clamped);
        r = V.FusedMultiplyAdd(k, V.Create(-Ln2Low), r);
        var mantissa = ExpOfReduced(r);
        return V.Select(LaneMath.IsNaN(x), LaneMath.NaN<V>(), ScaleByPowerOfTwo(mantissa, k));
    }

    /// <summary>
    /// e^(high + low) * factor for |low| far below |high| and high in [-800, 800], with one rounding into the subnormals; the
    /// low part carries what a product of doubles would lose.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static V ExpOfSum<V>(V high, V low, V factor)
        where V : unmanaged, ILanes<V>
    {
        var k = V.FusedMultiplyAdd(high, V.Create(Log2E), V.Create(RoundingShift)) - V.Create(RoundingShift);
        var exact = V.FusedMultiplyAdd(k, V.Create(-Ln2), high);
        var rest = V.FusedMultiplyAdd(k, V.Create(-Ln2Low), low);
        var r = exact + rest;
        var lost = (exact - r) + rest;
        var mantissa = (V.FusedMultiplyAdd(ExpTail(r), r * r, lost) + r) + V.Create(1.0);
        return ScaleByPowerOfTwo(mantissa * factor, k);
    }

    /// <summary>e^r; what 1 + r rounds away is carried into the rest, which saves a quarter of an ulp.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V ExpOfReduced<V>(V r)
        where V : unmanaged, ILanes<V>
    {
        var one = V.Create(1.0);
        var sum = one + r;
        var lost = r - (sum - one);
        return sum + V.FusedMultiplyAdd(ExpTail(r), r * r, lost);
    }

    /// <summary>
    /// (e^r - 1 - r) / r^2 for |r| &lt;= ln(2)/2: minimax, relative error of e^r below 2^-57.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V ExpTail<V>(V r)
        where V : unmanaged, ILanes<V>
    {
        var r2 = r * r;
        var r4 = r2 * r2;
        return Two(r, 2.7630307385358087e-07, 2.5000338080436436e-08)
            .Over(r4, Four(r, r2, 0.0013888888943753548, 0.00019841269506194506, 2.4801492950434905e-05, 2.755758605799561e-06))
            .Over(r4, Four(r, r2, 0.5000000000000011, 0.1666666666666641, 0.04166666666652979, 0.008333333333495056));
    }

    /// <summary>x * 2^k in two exact halves, so that only a subnormal or infinite result rounds.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V ScaleByPowerOfTwo<V>(V x, V k)
        where V : unmanaged, ILanes<V>
    {
        var half = V.FusedMultiplyAdd(k, V.Create(0.5), V.Create(RoundingShift));
        var rest = (k - (half - V.Create(RoundingShift))) + V.Create(RoundingShift);
        return x * PowerOfTwo(half) * PowerOfTwo(rest);
    }

    /// <summary>2^n for the integer n in the low bits of the argument.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V PowerOfTwo<V>(V shifted)
        where V : unmanaged, ILanes<V>
        => V.AddIntegers(V.ShiftLeft(shifted, 52), V.CreateBits(OneBits));

    /// <summary>e^x - 1 without cancellation, within 1 ulp. expm1(-inf) = -1, expm1(+inf) = +inf, expm1(+-0) = +-0.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Expm1<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        const double Tiny = 5.551115123125783e-17; // 2^-54
        var clamped = V.Select(V.LessThan(V.Create(710.0), x), V.Create(710.0), x);
        clamped = V.Select(V.LessThan(clamped, V.Create(-40.0)), V.Create(-40.0), clamped);
        var shifted = V.FusedMultiplyAdd(clamped, V.Create(Log2E), V.Create(RoundingShift));
        var k = shifted - V.Create(RoundingShift);
        var exact = V.FusedMultiplyAdd(k, V.Create(-Ln2), clamped);
        var rest = k * V.Create(-Ln2Low);
        var r = exact + rest;
        var lost = (exact - r) + rest;
        var curve = V.FusedMultiplyAdd(Expm1Tail(r), r * r, lost);
        var p = r + curve;
        var pLow = (r - p) + curve;

        // 2^k (1 + p) - 1, with what each sum rounds away; half of it is built and doubled, so that k = 1024 stays within range.
        var half = V.AddIntegers(V.ShiftLeft(shifted, 52), V.CreateBits(OneBits - (1UL << 52)));
        var whole = half - V.Create(0.5);
        var part = half * p;
        var sum = whole + part;
        var sumLow = ((whole - sum) + part) + ((half - whole) - V.Create(0.5));
        var result = (sum + V.FusedMultiplyAdd(half, pLow, sumLow)) * V.Create(2.0);
        result = V.Select(V.LessThan(V.Abs(x), V.Create(Tiny)), x, result);
        return V.Select(LaneMath.IsNaN(x), LaneMath.NaN<V>(), result);
    }

    /// <summary>As <see cref="ExpTail{V}(V)"/>, one degree up: expm1 is relative to r, not to 1.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Expm1Tail<V>(V r)
        where V : unmanaged, ILanes<V>
    {
        var r2 = r * r;
        var r4 = r2 * r2;
        return Two(r, 2.5109068289662572e-08, 2.092448800623241e-09)
            .Over(r4, Four(r, r2, 0.0001984126988619239, 2.4801587360721463e-05, 2.755724413016392e-06, 2.755724261681134e-07))
            .Over(r4, Four(r, r2, 0.16666666666666677, 0.0416666666666667, 0.00833333333332161, 0.0013888888888866757))
            .Over(r, V.Create(0.5));
    }
}
