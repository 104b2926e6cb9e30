using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>
/// The fixed fields of a stream's 128-bit counter: index 48, step 16, item 40, attempt 24 bits. The index is the trial, or for
/// values that take one 64-bit word each, the pair of trials that <see cref="UniformKernel"/> serves with one counter.
/// </summary>
internal static class Counter
{
    /// <summary>Largest number of trials that a run can have.</summary>
    public const long MaxTrials = 1L << 48;

    /// <summary>Largest step.</summary>
    public const int MaxStep = (1 << 16) - 1;

    /// <summary>Largest item (cell, claim) within a step.</summary>
    public const long MaxItem = (1L << 40) - 1;

    /// <summary>The attempt that no rejection reaches: uniforms beside those of the attempts come from here.</summary>
    public const int SideAttempt = (1 << 24) - 1;

    /// <summary>Second word from an index (one a lane) and a step.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Word1<V>(V index, int step)
        where V : unmanaged, ILanes<V> => V.ShiftRight(index, 32) | V.CreateBits((ulong)step << 16);

    /// <summary>Third word.</summary>
    public static ulong Word2(long item) => (uint)item;

    /// <summary>Fourth word.</summary>
    public static ulong Word3(long item, int attempt) => ((ulong)item >> 32) | ((ulong)attempt << 8);
}
