namespace Swarm.Engine.Summaries;

/// <summary>The values of bins that hold too many to be one cluster, gathered bin by bin. Scratch memory of one thread.</summary>
internal sealed class CrowdedBins
{
    private readonly double[] _values = new double[Edition.TrialsPerLeaf];
    private int[] _next = new int[4096];
    private readonly List<int> _bins = [];
    private int _total;

    /// <summary>Forgets the last leaf.</summary>
    public void Begin(int bins)
    {
        if (_next.Length < bins) _next = new int[2 * bins];
        foreach (var bin in _bins) _next[bin] = 0;
        _bins.Clear();
        _total = 0;
    }

    /// <summary>Marks a bin as crowded, in ascending order.</summary>
    public void Mark(int bin, int count)
    {
        _bins.Add(bin);

        // Where its values go, shifted by one so that zero means none.
        _next[bin] = _total + 1;
        _total += count;
    }

    /// <summary>Reads the leaf again and keeps the values of the marked bins.</summary>
    public void Gather(ReadOnlySpan<double> values, ValueMap map)
    {
        if (_total == 0) return;
        foreach (var x in values)
        {
            if (x < map.LowerEdge || x > map.UpperEdge) continue;
            ref var next = ref _next[LeafBins.BinOf(x, map)];
            if (next > 0) _values[next++ - 1] = x;
        }
    }

    /// <summary>The gathered values of a marked bin that holds so many; empty for other bins.</summary>
    public Span<double> ValuesOf(int bin, long count) =>
        _next[bin] == 0 ? [] : _values.AsSpan(_next[bin] - 1 - (int)count, (int)count);

    /// <summary>Sorts values of which many may be equal: those equal to the middle one are set apart first.</summary>
    public static void Sort(Span<double> values)
    {
        if (values.Length < 64)
        {
            values.Sort();
            return;
        }

        var pivot = values[values.Length / 2];
        int less = 0, at = 0, more = values.Length;
        while (at < more)
        {
            var x = values[at];
            if (x < pivot)
            {
                values[at++] = values[less];
                values[less++] = x;
            }
            else if (x > pivot)
            {
                values[at] = values[--more];
                values[more] = x;
            }
            else
            {
                at++;
            }
        }

        values[..less].Sort();
        values[more..].Sort();
    }
}
