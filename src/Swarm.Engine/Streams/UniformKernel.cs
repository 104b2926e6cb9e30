using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>What a distribution makes of one open uniform; a struct, so that kernels compile with it inside.</summary>
internal interface IUniformTransform
{
    /// <summary>The value at probability <paramref name="uniform"/>.</summary>
    V Of<V>(V uniform)
        where V : unmanaged, ILanes<V>;
}

/// <summary>
/// Fills a run of trials with values that each take one uniform. A Philox block has two 64-bit words and serves two trials:
/// trial t = 16 g + 8 w + j takes word w of the counter with index 8 g + j. Groups of 16 keep stores contiguous at every width.
/// </summary>
internal static unsafe class UniformKernel
{
    private const int TrialsPerGroup = 16;
    private const int IndexesPerGroup = 8;

    /// <summary>Fills at the slice's width.</summary>
    /// <param name="slice">Stream, trials and step.</param>
    /// <param name="transform">What becomes of each uniform.</param>
    /// <param name="destination">One value a trial; its length is a multiple of 16.</param>
    public static void Fill<T>(in DrawSlice slice, in T transform, Span<double> destination)
        where T : unmanaged, IUniformTransform
    {
        switch (slice.Width)
        {
            case LaneWidth.Vector512: Fill<Lanes512, T>(slice, transform, destination); break;
            case LaneWidth.Vector256: Fill<Lanes256, T>(slice, transform, destination); break;
            case LaneWidth.Vector128: Fill<Lanes128, T>(slice, transform, destination); break;
            default: Fill<Lanes64, T>(slice, transform, destination); break;
        }
    }

    private static void Fill<V, T>(DrawSlice slice, T transform, Span<double> destination)
        where V : unmanaged, ILanes<V>
        where T : unmanaged, IUniformTransform
    {
        fixed (double* start = destination)
        {
            FillUniforms<V>(slice, start, destination.Length);
            Transform<V, T>(transform, start, destination.Length);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static void FillUniforms<V>(DrawSlice slice, double* group, int trials)
        where V : unmanaged, ILanes<V>
    {
        ulong* keys = stackalloc ulong[Philox4x32.KeyWords];
        Philox4x32.ExpandKey(slice.Key, keys);
        ulong firstIndex = (ulong)slice.FirstTrial / TrialsPerGroup * IndexesPerGroup;
        double* end = group + trials;
        for (; group < end; group += TrialsPerGroup, firstIndex += IndexesPerGroup)
        {
            for (int lane = 0; lane < IndexesPerGroup; lane += V.Count)
            {
                V index = V.AddIntegers(V.CreateBits(firstIndex + (ulong)lane), V.Iota);
                V c0 = index;
                V c1 = Counter.Word1(index, slice.Step);
                V c2 = V.CreateBits(0);
                V c3 = V.CreateBits(0);
                Philox4x32.Generate(keys, ref c0, ref c1, ref c2, ref c3);
                V.Store(Uniform.Open(c0, c1), group + lane);
                V.Store(Uniform.Open(c2, c3), group + IndexesPerGroup + lane);
            }
        }
    }

    /// <summary>A loop of its own: one copy of a long transform is all that the compiler is willing to inline.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static void Transform<V, T>(T transform, double* values, int trials)
        where V : unmanaged, ILanes<V>
        where T : unmanaged, IUniformTransform
    {
        double* end = values + trials;
        for (; values < end; values += V.Count)
        {
            V.Store(transform.Of(V.Load(values)), values);
        }
    }
}
