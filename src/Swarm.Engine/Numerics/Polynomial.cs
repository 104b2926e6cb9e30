using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

/// <summary>Polynomials by Horner's rule, one fused multiply-add a step.</summary>
internal static class Polynomial
{
    /// <summary>One step: p * x + c.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Then<V>(this V p, V x, double c)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(p, x, V.Create(c));

    /// <summary>Coefficients from the constant upwards. A loop: for rare paths; hot ones write their steps out.</summary>
    public static V Evaluate<V>(ReadOnlySpan<double> ascending, V x)
        where V : unmanaged, ILanes<V>
    {
        var p = V.Create(ascending[^1]);
        for (var i = ascending.Length - 2; i >= 0; i--)
            p = p.Then(x, ascending[i]);
        return p;
    }
}
