using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

internal readonly struct Negate : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => -a;
}

internal readonly struct Not : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => Truth.Number(V.EqualTo(a, V.Create(0)));
}

internal readonly struct Abs : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => V.Abs(a);
}

internal readonly struct Exp : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => Elementary.Exp(a);
}

internal readonly struct Log : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => Elementary.Log(a);
}

internal readonly struct Sqrt : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => V.Sqrt(a);
}

internal readonly struct Floor : IUnaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a)
        where V : unmanaged, ILanes<V> => V.Floor(a);
}
