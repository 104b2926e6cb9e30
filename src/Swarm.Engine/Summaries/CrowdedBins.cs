using System.Runtime.CompilerServices;

namespace Swarm.Engine.Summaries;

/// <summary>The values of bins that hold too many to be one cluster, gathered bin by bin. Scratch memory of one thread.</summary>
internal sealed class CrowdedBins
{
    private readonly double[] _values = new double[Edition.TrialsPerLeaf + 1];
    private readonly List<int> _bins = [];
    private (int Next, int Step)[] _targets = new (int, int)[4096];
    private int _total;

    /// <summary>Forgets the last leaf.</summary>
    public void Begin(int bins)
    {
        foreach (var bin in _bins) _targets[bin] = default;
        _bins.Clear();
        _total = 0;
        if (_targets.Length < bins) _targets = new (int, int)[2 * bins];
    }

    /// <summary>Marks a bin as crowded, in ascending order.</summary>
    public void Mark(int bin, int count)
    {
        // Place 0 takes the values of all other bins, so that gathering needs no branch.
        _bins.Add(bin);
        _targets[bin] = (_total + 1, 1);
        _total += count;
    }

    /// <summary>Reads the leaf again and keeps the values of the marked bins.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void Gather(ReadOnlySpan<double> values, ReadOnlySpan<ushort> bins)
    {
        if (_total == 0) return;
        for (var i = 0; i < values.Length; i++)
        {
            ref var target = ref _targets[bins[i]];
            _values[target.Next] = values[i];
            target.Next += target.Step;
        }
    }

    /// <summary>The gathered values of a marked bin that holds so many; empty for other bins.</summary>
    public Span<double> ValuesOf(int bin, int count) =>
        _targets[bin].Step == 0 ? [] : _values.AsSpan(_targets[bin].Next - count, count);

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
