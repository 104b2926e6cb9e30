using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

/// <summary>
/// Polynomials in the order of Estrin (1960) by fours, then Horner in x^4: as many operations as Horner's rule and two more, but
/// a chain a third as long, which is what bounds a loop over vectors. Coefficients ascend.
/// </summary>
internal static class Polynomial
{
    /// <summary>c0 + c1 x.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Two<V>(V x, double c0, double c1)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(V.Create(c1), x, V.Create(c0));

    /// <summary>c0 + c1 x + c2 x^2.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Three<V>(V x, V x2, double c0, double c1, double c2)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(V.Create(c2), x2, Two(x, c0, c1));

    /// <summary>c0 + c1 x + c2 x^2 + c3 x^3.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Four<V>(V x, V x2, double c0, double c1, double c2, double c3)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(Two(x, c2, c3), x2, Two(x, c0, c1));

    /// <summary>The next lower terms under a higher part: higher * power + lower.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Over<V>(this V higher, V power, V lower)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(higher, power, lower);

    /// <summary>Horner's rule in a loop: for rare paths; hot ones write their terms out.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public static V Evaluate<V>(ReadOnlySpan<double> coefficients, V x)
        where V : unmanaged, ILanes<V>
    {
        var p = V.Create(coefficients[^1]);
        for (var i = coefficients.Length - 2; i >= 0; i--)
            p = V.FusedMultiplyAdd(p, x, V.Create(coefficients[i]));
        return p;
    }
}
