using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>The values of a leaf, spread over the bins of a map; the tails apart, value by value. Scratch memory of one thread.</summary>
internal sealed unsafe class LeafBins
{
    private const int Tile = 256;
    private readonly double[] _lower = new double[Edition.TrialsPerLeaf];
    private readonly double[] _upper = new double[Edition.TrialsPerLeaf];
    private int _lowerCount;
    private int _upperCount;

    /// <summary>Sum of the values and number of trials of each bin.</summary>
    public Bin[] Bins { get; private set; } = new Bin[4096];

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

    private void Spread<T>(ReadOnlySpan<double> values, ValueMap map)
        where T : unmanaged, ILanes<T>
    {
        var cells = stackalloc long[Tile];
        var parts = stackalloc double[Tile];
        fixed (double* first = values)
        fixed (Bin* bins = Bins)
        fixed ((double First, double Bins)* segments = map.Segments)
        {
            for (var from = 0; from < values.Length; from += Tile)
            {
                var count = Math.Min(Tile, values.Length - from);
                var whole = count / T.Count * T.Count;
                Locate<T>(first + from, whole, map, cells, parts);
                Locate<Lanes64>(first + from + whole, count - whole, map, cells + whole, parts + whole);
                Collect(first + from, count, cells, parts, segments, bins);
            }
        }
    }

    /// <summary>Finds each value's cell and the part of it that lies before the value; moves tail values out.</summary>
    private void Locate<T>(double* values, int count, ValueMap map, long* cells, double* parts)
        where T : unmanaged, ILanes<T>
    {
        T origin = T.Create(map.Origin), scale = T.Create(map.Scale), one = T.Create(1);
        T lower = T.Create(map.LowerEdge), upper = T.Create(map.UpperEdge), last = T.Create(ValueMap.LastPosition);

        // Adding 2^52 leaves a whole number below it in the low bits of the sum.
        T shift = T.Create(1L << 52), low = T.CreateBits(0xFFFF);
        for (var i = 0; i < count; i += T.Count)
        {
            var x = T.Load(values + i);
            var position = T.FusedMultiplyAdd(x - origin, scale, one);
            position = T.Select(T.LessThan(position, one), one, position);
            position = T.Select(T.LessThan(last, position), last, position);
            var outside = T.LessThan(x, lower) | T.LessThan(upper, x);
            position = position & ~outside;
            var cell = T.Floor(position);
            T.Store((cell + shift) & low, (double*)(cells + i));
            T.Store(position - cell, parts + i);
            var tails = T.SignBits(outside);
            if (tails != 0) MoveOut(values + i, tails, map.LowerEdge);
        }
    }

    private void MoveOut(double* values, ulong which, double lowerEdge)
    {
        for (; which != 0; which &= which - 1)
        {
            var x = values[System.Numerics.BitOperations.TrailingZeroCount(which)];
            if (x < lowerEdge) _lower[_lowerCount++] = x;
            else _upper[_upperCount++] = x;
        }
    }

    private static void Collect(
        double* values, int count, long* cells, double* parts, (double First, double Bins)* segments, Bin* bins)
    {
        for (var i = 0; i < count; i++)
        {
            var segment = segments + cells[i];
            var bin = bins + double.ConvertToIntegerNative<int>(segment->First + (parts[i] * segment->Bins));
            bin->Sum += values[i];
            bin->Count++;
        }
    }

    /// <summary>The bin of a value that is no tail value.</summary>
    public static int BinOf(double x, ValueMap map)
    {
        var position = Math.FusedMultiplyAdd(x - map.Origin, map.Scale, 1);
        position = position < 1 ? 1 : position;
        position = position > ValueMap.LastPosition ? ValueMap.LastPosition : position;
        var cell = Math.Floor(position);
        var (first, bins) = map.Segments[(int)cell];
        return (int)(first + ((position - cell) * bins));
    }
}

/// <summary>What a bin holds.</summary>
internal struct Bin
{
    public double Sum;
    public long Count;
}
