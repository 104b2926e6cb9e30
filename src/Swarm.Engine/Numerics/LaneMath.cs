using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

/// <summary>Small functions with one stated answer for -0 and NaN on every CPU, which the hardware's own do not give.</summary>
internal static class LaneMath
{
    /// <summary>The one NaN that the functions of this folder return: positive, quiet, no payload.</summary>
    public const ulong NaNBits = 0x7FF8_0000_0000_0000;

    internal const ulong MinNormalBits = 0x0010_0000_0000_0000;
    internal const ulong MaxFiniteBits = 0x7FEF_FFFF_FFFF_FFFF;
    internal const ulong SignBit = 0x8000_0000_0000_0000;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V NaN<V>()
        where V : unmanaged, ILanes<V>
        => V.CreateBits(NaNBits);

    /// <summary>All bits set where x is a NaN.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V IsNaN<V>(V x)
        where V : unmanaged, ILanes<V>
        => ~V.EqualTo(x, x);

    /// <summary>The lesser; -0 is less than +0; NaN where either is NaN.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Min<V>(V a, V b)
        where V : unmanaged, ILanes<V>
    {
        // Equal operands differ in the sign of zero alone: or-ing the bits keeps the minus.
        var lesser = V.Select(V.LessThan(a, b), a, b);
        var result = V.Select(V.EqualTo(a, b), a | b, lesser);
        return V.Select(IsNaN(a) | IsNaN(b), NaN<V>(), result);
    }

    /// <summary>The greater; +0 is greater than -0; NaN where either is NaN.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Max<V>(V a, V b)
        where V : unmanaged, ILanes<V>
    {
        var greater = V.Select(V.LessThan(b, a), a, b);
        var result = V.Select(V.EqualTo(a, b), a & b, greater);
        return V.Select(IsNaN(a) | IsNaN(b), NaN<V>(), result);
    }

    /// <summary>The magnitude of the first with the sign of the second.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V CopySign<V>(V magnitude, V sign)
        where V : unmanaged, ILanes<V>
        => V.Abs(magnitude) | (sign & V.CreateBits(SignBit));

    /// <summary>True if any lane is not a positive, normal, finite number: zero, negative, subnormal, infinite or NaN.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static bool AnyOutsidePositiveNormals<V>(V x)
        where V : unmanaged, ILanes<V>
        => AnyOutside(x, MinNormalBits, MaxFiniteBits);

    /// <summary>
    /// True if any lane's bits, as a signed integer, lie outside the two positive ones: one test for NaN, sign and range, which
    /// costs two subtractions.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    internal static bool AnyOutside<V>(V x, ulong lowest, ulong highest)
        where V : unmanaged, ILanes<V>
        => V.Any(V.SubtractIntegers(x, V.CreateBits(lowest)) | V.SubtractIntegers(V.CreateBits(highest), x));
}
