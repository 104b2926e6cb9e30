namespace Swarm.Engine.Summaries;

/// <summary>Values that are sketched one by one: few, or few different ones, or too unruly to be binned.</summary>
internal sealed class ExactValues
{
    private const int SlotBits = 12;
    private const int Probe = 256;
    private const int MostDistinct = 1 << (SlotBits - 1);
    private readonly double[] _slots = new double[1 << SlotBits];
    private readonly int[] _counts = new int[1 << SlotBits];
    private readonly double[] _distinct = new double[MostDistinct];
    private double[] _sorted = [];

    /// <summary>Adds the values to a digest in ascending order.</summary>
    public void AddSorted(ReadOnlySpan<double> values, DigestBuilder builder)
    {
        if (_sorted.Length < values.Length) _sorted = new double[Math.Max(values.Length, Edition.TrialsPerLeaf)];
        var sorted = _sorted.AsSpan(0, values.Length);
        values.CopyTo(sorted);
        sorted.Sort();
        AddRuns(sorted, builder);
    }

    /// <summary>Adds ascending values, equal ones as one atom.</summary>
    public static void AddRuns(ReadOnlySpan<double> sorted, DigestBuilder builder)
    {
        for (int from = 0, to; from < sorted.Length; from = to)
        {
            for (to = from + 1; to < sorted.Length && sorted[to] == sorted[from]; to++) { }

            // Adding +0 turns -0 into +0, which equals it.
            builder.AddExact(sorted[from] + 0.0, to - from);
        }
    }

    /// <summary>True where half of the first values repeat others.</summary>
    public bool LooksDistinct(ReadOnlySpan<double> values)
    {
        Array.Clear(_counts);
        var repeats = 0;
        foreach (var value in values[..Probe])
        {
            var slot = SlotOf(value + 0.0);
            repeats += _counts[slot]++ > 0 ? 1 : 0;
            _slots[slot] = value + 0.0;
        }

        return repeats >= Probe / 2;
    }

    /// <summary>Adds the values if few of them are different, counted in a hash table; false, and nothing added, otherwise.</summary>
    public bool TryAddDistinct(ReadOnlySpan<double> values, DigestBuilder builder)
    {
        Array.Clear(_counts);
        var distinct = 0;
        foreach (var value in values)
        {
            var x = value + 0.0;
            var slot = SlotOf(x);
            if (_counts[slot]++ > 0) continue;
            if (distinct == MostDistinct) return false;
            _slots[slot] = x;
            _distinct[distinct++] = x;
        }

        var sorted = _distinct.AsSpan(0, distinct);
        sorted.Sort();
        foreach (var x in sorted) builder.Add(x, _counts[SlotOf(x)], true);
        return true;
    }

    private int SlotOf(double x)
    {
        var slot = (int)((BitConverter.DoubleToUInt64Bits(x) * 0x9E3779B97F4A7C15) >> (64 - SlotBits));
        while (_counts[slot] > 0 && _slots[slot] != x) slot = (slot + 1) & ((1 << SlotBits) - 1);
        return slot;
    }
}
