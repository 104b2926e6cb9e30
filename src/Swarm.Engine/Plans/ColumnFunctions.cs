using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>A function of one operand, compiled into the loop of <see cref="ColumnKernels{V}"/>.</summary>
internal interface IUnaryFunction
{
    static abstract V Of<V>(V a)
        where V : unmanaged, ILanes<V>;
}

/// <summary>A function of two operands, compiled into the loop of <see cref="ColumnKernels{V}"/>.</summary>
internal interface IBinaryFunction
{
    static abstract V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V>;
}

internal static class Truth
{
    /// <summary>1 where a comparison mask is set, else 0.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Number<V>(V mask)
        where V : unmanaged, ILanes<V> => mask & V.Create(1);

    /// <summary>Mask of the lanes that are true: anything but zero.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Mask<V>(V value)
        where V : unmanaged, ILanes<V> => ~V.EqualTo(value, V.Create(0));
}
