namespace Swarm.Engine.Summaries;

/// <summary>
/// Cuts a sorted stream of clusters into the clusters of a digest, in one pass from the least to the greatest. Holds scratch
/// memory: one a thread.
/// </summary>
internal sealed class DigestBuilder
{
    // A value that repeats more often than this share of a cluster's limit stays an atom, so lattices of values stay exact.
    private const double AtomShare = 0.125;
    private double[] _means = new double[4096];
    private long[] _marks = new long[4096];
    private int _closed;
    private ScaleFunction _scale;
    private long _total;
    private long _before;
    private long _weight;
    private double _first;
    private double _last;
    private double _excess;
    private bool _atom;
    private double _limit;
    private double _atomLimit;

    /// <summary>Starts a digest of so many trials.</summary>
    public void Begin(long total)
    {
        _scale = new ScaleFunction(total);
        _total = total;
        _closed = 0;
        _before = 0;
        _weight = 0;
    }

    /// <summary>Takes the next cluster; means must not descend.</summary>
    public void Add(double mean, long weight, bool atom)
    {
        if (_weight > 0)
        {
            if (atom && _atom && mean == _last)
            {
                _weight += weight;
                return;
            }

            if (MayJoin(weight, atom))
            {
                _excess += weight * (mean - _first);
                _weight += weight;
                _last = mean;
                _atom = false;
                return;
            }

            Close();
        }

        Open(mean, weight, atom);
    }

    /// <summary>Merges two digests in the total order (mean, atoms first, weight).</summary>
    public void Merge(TDigest left, TDigest right)
    {
        Begin(left.TotalWeight + right.TotalWeight);
        ReadOnlySpan<double> a = left.Means, b = right.Means;
        ReadOnlySpan<long> aMarks = left.Marks, bMarks = right.Marks;
        int i = 0, j = 0;
        while (i < a.Length && j < b.Length)
        {
            if (a[i] < b[j] || (a[i] == b[j] && Precedes(aMarks[i], bMarks[j])))
            {
                Add(a[i], aMarks[i] >> 1, (aMarks[i] & 1) == 0);
                i++;
            }
            else
            {
                Add(b[j], bMarks[j] >> 1, (bMarks[j] & 1) == 0);
                j++;
            }
        }

        for (; i < a.Length; i++) Add(a[i], aMarks[i] >> 1, (aMarks[i] & 1) == 0);
        for (; j < b.Length; j++) Add(b[j], bMarks[j] >> 1, (bMarks[j] & 1) == 0);
    }

    /// <summary>Ends the digest and writes it; returns how many clusters it has.</summary>
    public int Finish()
    {
        if (_weight > 0) Close();
        if (_before != _total) throw new InvalidOperationException($"The digest holds {_before} trials, not {_total}.");
        return _closed;
    }

    /// <summary>Copies the finished digest.</summary>
    public void CopyTo(TDigest target) => target.Assign(_means.AsSpan(0, _closed), _marks.AsSpan(0, _closed), _total);

    private static bool Precedes(long mark, long other) => (mark & 1) != (other & 1) ? (mark & 1) == 0 : mark <= other;

    private bool MayJoin(long weight, bool atom) =>
        _weight + weight <= _limit
        && !(_atom && _weight > _atomLimit)
        && !(atom && weight > _atomLimit)
        && _before + _weight + weight < _total;

    private void Open(double mean, long weight, bool atom)
    {
        _weight = weight;
        _first = mean;
        _last = mean;
        _excess = 0;
        _atom = atom;
        var atStart = _scale.LimitAt(_before);
        var atEnd = _scale.LimitAt(_before + atStart);
        _limit = atStart < atEnd ? atStart : atEnd;
        _atomLimit = _limit * AtomShare > 1 ? _limit * AtomShare : 1;
    }

    private void Close()
    {
        if (_closed == _means.Length)
        {
            Array.Resize(ref _means, 2 * _closed);
            Array.Resize(ref _marks, 2 * _closed);
        }

        // The clamp holds the order against rounding (and against overflow at the end of the range).
        var mean = _first + (_excess / _weight);
        _means[_closed] = _atom ? _first : mean < _last ? mean : _last;
        _marks[_closed] = TDigest.Mark(_weight, _atom);
        _closed++;
        _before += _weight;
        _weight = 0;
    }
}
