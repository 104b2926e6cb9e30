using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>
/// Loops over the trials of a tile. A constant operand is eight equal doubles read again and again: its stride is 0, so that
/// every function has one loop.
/// </summary>
/// <typeparam name="V">Vector width.</typeparam>
internal static unsafe class ColumnKernels<V>
    where V : unmanaged, ILanes<V>
{
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public static void Unary<F>(Operand a, double* target, int trials)
        where F : IUnaryFunction
    {
        double* source = a.Start;
        double* end = target + trials;
        nint stride = a.IsConstant ? 0 : V.Count;
        for (; target < end; target += V.Count, source += stride)
        {
            V.Store(F.Of(V.Load(source)), target);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public static void Binary<F>(Operand a, Operand b, double* target, int trials)
        where F : IBinaryFunction
    {
        double* left = a.Start;
        double* right = b.Start;
        double* end = target + trials;
        nint leftStride = a.IsConstant ? 0 : V.Count;
        nint rightStride = b.IsConstant ? 0 : V.Count;
        for (; target < end; target += V.Count, left += leftStride, right += rightStride)
        {
            V.Store(F.Of(V.Load(left), V.Load(right)), target);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public static void Select(Operand condition, Operand a, Operand b, double* target, int trials)
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            V mask = Truth.Mask(V.Load(condition.At(i)));
            V.Store(V.Select(mask, V.Load(a.At(i)), V.Load(b.At(i))), target + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public static void Copy(Operand a, double* target, int trials)
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            V.Store(V.Load(a.At(i)), target + i);
        }
    }

    /// <summary>The first trial whose value is not finite and whose condition, if there is one, is true; -1 if none.</summary>
    public static int FirstFault(Operand a, Operand? condition, int trials)
    {
        if (condition is not { } chosen)
        {
            return AllFinite(a, trials) ? -1 : Locate(a, null, trials);
        }

        return AllFinite(a, chosen, trials) ? -1 : Locate(a, condition, trials);
    }

    /// <summary>Zero times a finite value is zero, times any other NaN: one operation a vector, and one test a column.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static bool AllFinite(Operand a, int trials)
    {
        double* source = a.Start;
        double* end = source + (a.IsConstant ? V.Count : trials);
        V zero = V.Create(0);
        V sum = zero;
        for (; source < end; source += V.Count)
        {
            sum = V.FusedMultiplyAdd(V.Load(source), zero, sum);
        }

        return !V.Any(~V.EqualTo(sum, zero));
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static bool AllFinite(Operand a, Operand condition, int trials)
    {
        V zero = V.Create(0);
        V sum = zero;
        for (int i = 0; i < trials; i += V.Count)
        {
            V value = V.Load(a.At(i)) & Truth.Mask(V.Load(condition.At(i)));
            sum = V.FusedMultiplyAdd(value, zero, sum);
        }

        return !V.Any(~V.EqualTo(sum, zero));
    }

    private static int Locate(Operand a, Operand? condition, int trials)
    {
        int i = 0;
        while (!V.Any(Faulty(a, condition, i)))
        {
            i += V.Count;
        }

        return Math.Min(i + System.Numerics.BitOperations.TrailingZeroCount(V.SignBits(Faulty(a, condition, i))), trials - 1);
    }

    private static V Faulty(Operand a, Operand? condition, int i)
    {
        V faulty = ~V.LessThan(V.Abs(V.Load(a.At(i))), V.Create(double.PositiveInfinity));
        return condition is { } c ? faulty & Truth.Mask(V.Load(c.At(i))) : faulty;
    }
}
