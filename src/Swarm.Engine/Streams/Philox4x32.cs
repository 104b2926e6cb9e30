using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>
/// Philox4x32-10 (Salmon, Moraes, Dror &amp; Shaw 2011): a function from a 128-bit counter and a 64-bit key to 128 random bits.
/// Each 64-bit lane of <c>c0..c3</c> carries one 32-bit word of one counter in its low half. The high halves fill with
/// leftovers of the products, which nothing reads: the next product takes low halves, and the caller masks at the end.
/// </summary>
internal static unsafe class Philox4x32
{
    /// <summary>Round keys of one stream: two a round.</summary>
    public const int KeyWords = 20;

    private const ulong Multiplier0 = 0xD2511F53;
    private const ulong Multiplier1 = 0xCD9E8D57;
    private const uint Weyl0 = 0x9E3779B9;
    private const uint Weyl1 = 0xBB67AE85;

    /// <summary>Writes the round keys of a stream.</summary>
    public static void ExpandKey(StreamKey key, ulong* roundKeys)
    {
        uint k0 = (uint)key.Value;
        uint k1 = (uint)(key.Value >> 32);
        for (int i = 0; i < KeyWords; i += 2)
        {
            roundKeys[i] = k0;
            roundKeys[i + 1] = k1;
            k0 += Weyl0;
            k1 += Weyl1;
        }
    }

    /// <summary>Ten rounds in place. Only the low 32 bits of each lane of the results mean anything.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Generate<V>(ulong* roundKeys, ref V c0, ref V c1, ref V c2, ref V c3)
        where V : unmanaged, ILanes<V>
    {
        Round(roundKeys, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 2, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 4, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 6, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 8, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 10, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 12, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 14, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 16, ref c0, ref c1, ref c2, ref c3);
        Round(roundKeys + 18, ref c0, ref c1, ref c2, ref c3);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void Round<V>(ulong* roundKey, ref V c0, ref V c1, ref V c2, ref V c3)
        where V : unmanaged, ILanes<V>
    {
        V product0 = V.MultiplyLow32(c0, V.CreateBits(Multiplier0));
        V product1 = V.MultiplyLow32(c2, V.CreateBits(Multiplier1));
        c0 = V.Xor(V.ShiftRight(product1, 32), c1, V.CreateBits(roundKey[0]));
        c2 = V.Xor(V.ShiftRight(product0, 32), c3, V.CreateBits(roundKey[1]));
        c1 = product1;
        c3 = product0;
    }
}
