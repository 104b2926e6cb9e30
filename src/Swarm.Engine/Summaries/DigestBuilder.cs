using System.Runtime.CompilerServices;

namespace Swarm.Engine.Summaries;

/// <summary>
/// Makes digests: takes sorted clusters, from two digests or from the values of a leaf, and joins neighbours, in one pass from
/// the least to the greatest, as the grid says. Holds scratch memory: one a thread.
/// </summary>
internal sealed class DigestBuilder
{
    // A repeated value stays an atom if it fills this share of its cell, so lattices of values stay exact.
    private const int CellsPerAtom = 8;
    private readonly ClusterGrids _grids = new();
    private double[] _means = new double[4096];
    private long[] _marks = new long[4096];
    private int _taken;
    private long _total;
    private int _made;

    /// <summary>Starts a digest of at most so many clusters before they are joined.</summary>
    public void Begin(int clusters)
    {
        _taken = 0;
        _total = 0;
        if (_means.Length >= clusters) return;
        _means = new double[2 * clusters];
        _marks = new long[2 * clusters];
    }

    /// <summary>Takes the next cluster; means must not descend.</summary>
    public void Add(double mean, long weight, bool atom)
    {
        _means[_taken] = mean;
        _marks[_taken] = TDigest.Mark(weight, atom);
        _taken++;
        _total += weight;
    }

    /// <summary>As <see cref="Add"/>, for exact values after a mean that rounding may have lifted above them.</summary>
    public void AddExact(double value, long weight)
    {
        for (var k = _taken - 1; k >= 0 && _means[k] > value; k--) _means[k] = value;
        Add(value, weight, true);
    }

    /// <summary>As <see cref="Add"/>, for a mean that rounding may have let fall below its predecessor.</summary>
    public void AddRounded(double mean, long weight)
    {
        var floor = _taken == 0 ? mean : _means[_taken - 1];
        Add(mean < floor ? floor : mean, weight, atom: false);
    }

    /// <summary>Makes the digest of two others together. Which is left makes no difference.</summary>
    public int Merge(TDigest left, TDigest right)
    {
        Begin(left.Count + right.Count);
        Interleave(left, right);
        _taken = left.Count + right.Count;
        _total = left.TotalWeight + right.TotalWeight;
        return Join();
    }

    /// <summary>Joins neighbours of what was taken; returns how many clusters are left.</summary>
    public int Join()
    {
        _made = _taken == 0 ? 0 : Join(_grids.For(_total).DoubledBounds);
        return _made;
    }

    /// <summary>Copies the finished digest.</summary>
    public void CopyTo(TDigest target) => target.Assign(_means.AsSpan(0, _made), _marks.AsSpan(0, _made), _total);

    /// <summary>Sorts two digests into one list in the total order (mean, atoms first, weight).</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Interleave(TDigest left, TDigest right)
    {
        ReadOnlySpan<double> a = left.GuardedMeans, b = right.GuardedMeans;
        ReadOnlySpan<long> aMarks = left.GuardedMarks, bMarks = right.GuardedMarks;
        Span<double> means = _means;
        Span<long> marks = _marks;
        var count = left.Count + right.Count;
        int i = 0, j = 0;
        for (var k = 0; k < count; k++)
        {
            // Which comes first is a coin toss that no branch predictor wins, so nothing branches on it.
            var x = a[i];
            var y = b[j];
            var mark = aMarks[i];
            var other = bMarks[j];
            var taken = y < x ? 1 : 0;
            if (x == y) taken = Precedes(other, mark) ? 1 : 0;
            means[k] = Math.Min(x, y);
            marks[k] = mark ^ ((mark ^ other) & -(long)taken);
            i += 1 - taken;
            j += taken;
        }
    }

    private static bool Precedes(long mark, long other) => (mark & 1) != (other & 1) ? (mark & 1) == 0 : mark < other;

    /// <summary>In place: the list of made clusters never overtakes that of taken ones.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private int Join(ReadOnlySpan<long> bounds)
    {
        var means = _means.AsSpan(0, _taken);
        var marks = _marks.AsSpan(0, _taken);
        var made = 0;
        var cell = 0;
        var bound = bounds[0];
        var atomWeight = AtomWeight(bounds, 0);
        var doubledRank = 0L;
        double first = means[0], last = first, excess = 0;
        long weight = 0;
        var atom = true;
        for (var k = 0; k < means.Length; k++)
        {
            var mean = means[k];
            var mark = marks[k];
            var itsWeight = mark >> 1;
            var itsAtom = (mark & 1) == 0;
            var middle = doubledRank + itsWeight;
            doubledRank += mark & ~1L;
            var sameAtom = atom && itsAtom && mean == last;
            if (sameAtom)
            {
                weight += itsWeight;
                continue;
            }

            if (middle < bound && k < means.Length - 1 && weight > 0 && !(itsAtom && itsWeight > atomWeight) && !(atom && weight > atomWeight))
            {
                excess += itsWeight * (mean - first);
                weight += itsWeight;
                last = mean;
                atom = false;
                continue;
            }

            if (weight > 0)
            {
                Close(means, marks, made++, first, last, excess, weight, atom);
            }

            if (middle >= bound)
            {
                do
                {
                    bound = bounds[++cell];
                }
                while (middle >= bound);
                atomWeight = AtomWeight(bounds, cell);
            }

            first = mean;
            last = mean;
            excess = 0;
            weight = itsWeight;
            atom = itsAtom;
        }

        Close(means, marks, made++, first, last, excess, weight, atom);
        return made;
    }

    private static void Close(
        Span<double> means, Span<long> marks, int made, double first, double last, double excess, long weight, bool atom)
    {
        // The clamp holds the order against rounding (and against overflow at the end of the range).
        var mean = first + (excess / weight);
        means[made] = mean < last ? mean : last;
        marks[made] = TDigest.Mark(weight, atom);
    }

    private static long AtomWeight(ReadOnlySpan<long> bounds, int cell)
    {
        if (cell == 0 || cell == bounds.Length - 1) return 1;
        return Math.Max(1, (bounds[cell] - bounds[cell - 1]) / (2 * CellsPerAtom));
    }
}
