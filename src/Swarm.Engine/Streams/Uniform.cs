using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>From random words to doubles.</summary>
internal static class Uniform
{
    private const ulong Low32 = 0xFFFFFFFF;
    private const ulong One = 0x3FF0000000000000;

    // 1 - 2^-53: the largest double below 1.
    private const double BelowOne = 1.0 - 1.1102230246251565e-16;

    /// <summary>
    /// A uniform on the open interval (0, 1): (k + 1/2) 2^-52 for the top 52 bits k of the two words, so never 0 or 1,
    /// symmetric about 1/2, and exact: u, 1 - u and 2u - 1 are all doubles.
    /// </summary>
    /// <param name="low">Word whose top 20 bits are used (low half of each lane).</param>
    /// <param name="high">Word whose 32 bits are used (low half of each lane).</param>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Open<V>(V low, V high)
        where V : unmanaged, ILanes<V>
    {
        V word = V.ShiftLeft(high, 32) | (low & V.CreateBits(Low32));
        V inOneToTwo = V.ShiftRight(word, 12) | V.CreateBits(One);
        return inOneToTwo - V.Create(BelowOne);
    }

    /// <summary>
    /// A whole number 0..n-1 from one 32-bit word: the high half of word times n (Lemire 2019, without its rejection step). No
    /// value's chance is off by more than 2^-32; n is at most 2^20, so the relative bias is under 2.5e-4 and for a table of 55
    /// under 1.3e-8.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Below<V>(V word, V n)
        where V : unmanaged, ILanes<V> => V.ShiftRight(V.MultiplyLow32(word, n), 32);
}
