using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>Random words of one item (a cell, a claim) of one step, for a run of trials.</summary>
/// <param name="RoundKeys">Expanded key; it must outlive this.</param>
/// <param name="FirstTrial">First trial of the run.</param>
/// <param name="Step">Step.</param>
/// <param name="Item">Item within the step.</param>
internal readonly unsafe record struct ItemStream(nint RoundKeys, long FirstTrial, int Step, long Item)
{
    /// <summary>The four 32-bit words of an attempt, one trial a lane, in the low halves of the lanes.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Generate<V>(V index, int attempt, out V c0, out V c1, out V c2, out V c3)
        where V : unmanaged, ILanes<V>
    {
        c0 = index;
        c1 = Counter.Word1(index, Step);
        c2 = V.CreateBits(Counter.Word2(Item));
        c3 = V.CreateBits(Counter.Word3(Item, attempt));
        Philox4x32.Generate((ulong*)RoundKeys, ref c0, ref c1, ref c2, ref c3);
    }

    /// <summary>As above, for another item in each lane; this stream's own item means nothing.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Generate<V>(V index, V item, int attempt, out V c0, out V c1, out V c2, out V c3)
        where V : unmanaged, ILanes<V>
    {
        c0 = index;
        c1 = Counter.Word1(index, Step);
        c2 = item;
        c3 = V.ShiftRight(item, 32) | V.CreateBits(Counter.Word3(0, attempt));
        Philox4x32.Generate((ulong*)RoundKeys, ref c0, ref c1, ref c2, ref c3);
    }
}
