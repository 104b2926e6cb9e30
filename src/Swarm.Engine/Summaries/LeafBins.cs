using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>The values of a leaf, spread over the bins of a map; the tails apart, value by value. Scratch memory of one thread.</summary>
internal sealed unsafe class LeafBins
{
    private const int Tile = 256;
    private const int WordBits = 64;
    private readonly double[] _lower = new double[Edition.TrialsPerLeaf];
    private readonly double[] _upper = new double[Edition.TrialsPerLeaf];
    private readonly ushort[] _places = new ushort[Edition.TrialsPerLeaf];
    private int _lowerCount;
    private int _upperCount;

    /// <summary>Sum of the values and number of trials of each bin.</summary>
    public Bin[] Bins { get; private set; } = new Bin[4096];

    /// <summary>The bin of each value; tail values are nowhere.</summary>
    public ReadOnlySpan<ushort> Places => _places;

    public Span<double> Lower => _lower.AsSpan(0, _lowerCount);

    public Span<double> Upper => _upper.AsSpan(0, _upperCount);

    public void Spread(ReadOnlySpan<double> values, ValueMap map, LaneWidth width)
    {
        if (Bins.Length < map.Bins) Bins = new Bin[2 * map.Bins];
        Array.Clear(Bins, 0, map.Bins);
        _lowerCount = 0;
        _upperCount = 0;
        switch (width)
        {
            case LaneWidth.Vector512: Spread<Lanes512>(values, map); break;
            case LaneWidth.Vector256: Spread<Lanes256>(values, map); break;
            case LaneWidth.Vector128: Spread<Lanes128>(values, map); break;
            default: Spread<Lanes64>(values, map); break;
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Spread<T>(ReadOnlySpan<double> values, ValueMap map)
        where T : unmanaged, ILanes<T>
    {
        var cells = stackalloc long[Tile];
        var parts = stackalloc double[Tile];
        var tails = stackalloc ulong[Tile / WordBits];
        fixed (double* first = values)
        fixed (Bin* bins = Bins)
        fixed (ushort* places = _places)
        fixed ((double First, double Bins)* segments = map.Segments)
        {
            for (var from = 0; from < values.Length; from += Tile)
            {
                var count = Math.Min(Tile, values.Length - from);
                new Span<ulong>(tails, Tile / WordBits).Clear();
                var whole = count / WordBits * WordBits;
                Locate<T>(first + from, 0, whole, map, cells, parts, tails);
                Locate<Lanes64>(first + from, whole, count, map, cells, parts, tails);
                for (var word = 0; word < Tile / WordBits; word++) MoveOut(first + from + (word * WordBits), tails[word], map.LowerEdge);
                Collect(first + from, count, cells, parts, segments, bins, places + from);
            }
        }
    }

    /// <summary>Finds each value's cell, and the part of it that lies before the value, and marks the tails.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Locate<T>(double* values, int from, int to, ValueMap map, long* cells, double* parts, ulong* tails)
        where T : unmanaged, ILanes<T>
    {
        T origin = T.Create(map.Origin), scale = T.Create(map.Scale), one = T.Create(1);
        T lower = T.Create(map.LowerEdge), upper = T.Create(map.UpperEdge), last = T.Create(ValueMap.LastPosition);

        // Adding 2^52 leaves a whole number below it in the low bits of the sum.
        T shift = T.Create(1L << 52), low = T.CreateBits(0xFFFF);
        for (var i = from; i < to; i += T.Count)
        {
            var x = T.Load(values + i);
            var outside = T.LessThan(x, lower) | T.LessThan(upper, x);
            tails[i / WordBits] |= T.SignBits(outside) << (i % WordBits);
            var position = T.FusedMultiplyAdd(x - origin, scale, one);
            position = T.Select(T.LessThan(position, one), one, position);
            position = T.Select(T.LessThan(last, position), last, position);
            position = position & ~outside;
            var cell = T.Floor(position);
            T.Store((cell + shift) & low, (double*)(cells + i));
            T.Store(position - cell, parts + i);
        }
    }

    private void MoveOut(double* values, ulong which, double lowerEdge)
    {
        for (; which != 0; which &= which - 1)
        {
            var x = values[BitOperations.TrailingZeroCount(which)];
            if (x < lowerEdge) _lower[_lowerCount++] = x;
            else _upper[_upperCount++] = x;
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void Collect(
        double* values, int count, long* cells, double* parts, (double First, double Bins)* segments, Bin* bins, ushort* places)
    {
        // Four at a time: their bins are found before any is written, so the additions do not wait for each other.
        nint i = 0;
        for (; i < count - 3; i += 4)
        {
            var a = places[i] = BinOf(cells[i], parts[i], segments);
            var b = places[i + 1] = BinOf(cells[i + 1], parts[i + 1], segments);
            var c = places[i + 2] = BinOf(cells[i + 2], parts[i + 2], segments);
            var d = places[i + 3] = BinOf(cells[i + 3], parts[i + 3], segments);
            bins[a].Add(values[i]);
            bins[b].Add(values[i + 1]);
            bins[c].Add(values[i + 2]);
            bins[d].Add(values[i + 3]);
        }

        for (; i < count; i++) bins[places[i] = BinOf(cells[i], parts[i], segments)].Add(values[i]);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static ushort BinOf(long cell, double part, (double First, double Bins)* segments) =>
        (ushort)double.ConvertToIntegerNative<long>(segments[cell].First + (part * segments[cell].Bins));
}

/// <summary>What a bin holds.</summary>
internal struct Bin
{
    private Vector128<double> _sumAndCount;

    public readonly double Sum => _sumAndCount[0];

    public readonly int Count => (int)_sumAndCount[1];

    /// <summary>Both in one addition.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public void Add(double value) => _sumAndCount += Vector128.Create(value, 1.0);
}
