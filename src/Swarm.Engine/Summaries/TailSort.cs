using System.Runtime.CompilerServices;

namespace Swarm.Engine.Summaries;

/// <summary>
/// Sorts the few hundred values of a tail: buckets by the logarithm of the distance from the tail's edge, which suits light and
/// heavy tails alike, then insertion. The order of equal values cannot be seen, so the result is that of any sort.
/// </summary>
internal sealed class TailSort
{
    private const int Most = 512;
    private const int Buckets = 256;

    // 16 buckets for each doubling of the distance.
    private const int DroppedBits = 52 - 4;
    private readonly int[] _ends = new int[Buckets + 1];
    private readonly double[] _values = new double[Most];

    /// <summary>Sorts values that all lie on one side of an edge: above it, or below.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void Sort(Span<double> values, double edge)
    {
        if (values.Length is < 16 or > Most)
        {
            CrowdedBins.Sort(values);
            return;
        }

        Array.Clear(_ends);
        var farthest = 0L;
        foreach (var x in values) farthest = Math.Max(farthest, Distance(x, edge));
        var ascending = values[0] >= edge;
        foreach (var x in values) _ends[Bucket(x, edge, farthest, ascending) + 1]++;
        for (var i = 1; i <= Buckets; i++) _ends[i] += _ends[i - 1];
        foreach (var x in values) _values[_ends[Bucket(x, edge, farthest, ascending)]++] = x;
        _values.AsSpan(0, values.Length).CopyTo(values);
        Insert(values);
    }

    private static long Distance(double x, double edge) => BitConverter.DoubleToInt64Bits(Math.Abs(x - edge)) >> DroppedBits;

    private static int Bucket(double x, double edge, long farthest, bool ascending)
    {
        var below = Math.Min(Buckets - 1, farthest - Distance(x, edge));
        return (int)(ascending ? Buckets - 1 - below : below);
    }

    private static void Insert(Span<double> values)
    {
        for (var i = 1; i < values.Length; i++)
        {
            var x = values[i];
            var k = i - 1;
            while (k >= 0 && values[k] > x)
            {
                values[k + 1] = values[k];
                k--;
            }

            values[k + 1] = x;
        }
    }
}
