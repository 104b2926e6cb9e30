using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

internal readonly struct Add : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => a + b;
}

internal readonly struct Subtract : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => a - b;
}

internal readonly struct Multiply : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => a * b;
}

internal readonly struct Divide : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => a / b;
}

internal readonly struct Power : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Elementary.Pow(a, b);
}

internal readonly struct Less : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(V.LessThan(a, b));
}

internal readonly struct LessOrEqual : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(V.LessThanOrEqual(a, b));
}

internal readonly struct Equal : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(V.EqualTo(a, b));
}

internal readonly struct NotEqual : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(~V.EqualTo(a, b));
}

internal readonly struct And : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(Truth.Mask(a) & Truth.Mask(b));
}

internal readonly struct Or : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => Truth.Number(Truth.Mask(a) | Truth.Mask(b));
}

internal readonly struct Min : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => LaneMath.Min(a, b);
}

internal readonly struct Max : IBinaryFunction
{
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Of<V>(V a, V b)
        where V : unmanaged, ILanes<V> => LaneMath.Max(a, b);
}
