namespace Swarm.Engine.Summaries;

/// <summary>
/// Ranks and values of a digest. The k-th smallest trial sits at position k - 1/2 on an axis from 0 to n. An atom is flat; a
/// mixed cluster has its mean at the middle of its positions, and values between such anchors are interpolated linearly.
/// </summary>
internal sealed class DigestIndex
{
    private double[] _means = [];
    private long[] _marks = [];
    private long[] _below = [];
    private double[] _sumBelow = [];
    private double[] _sumAbove = [];
    private int _count;

    public long Total { get; private set; }

    public static DigestIndex Of(TDigest digest)
    {
        var index = new DigestIndex();
        index.Read(digest);
        return index;
    }

    /// <summary>Takes another digest; keeps no reference to it.</summary>
    public void Read(TDigest digest)
    {
        if (digest.Count == 0) throw new ArgumentException("An empty digest has no quantiles.");
        _count = digest.Count;
        Total = digest.TotalWeight;
        if (_means.Length < _count)
        {
            _means = new double[_count];
            _marks = new long[_count];
            _below = new long[_count + 1];
            _sumBelow = new double[_count + 1];
            _sumAbove = new double[_count + 1];
        }

        digest.Means.CopyTo(_means);
        digest.Marks.CopyTo(_marks);
        _sumBelow[0] = 0;
        for (var i = 0; i < _count; i++)
        {
            _below[i + 1] = _below[i] + WeightAt(i);
            _sumBelow[i + 1] = _sumBelow[i] + (WeightAt(i) * _means[i]);
        }

        _sumAbove[_count] = 0;
        for (var i = _count - 1; i >= 0; i--) _sumAbove[i] = _sumAbove[i + 1] + (WeightAt(i) * _means[i]);
    }

    public int Count => _count;

    public double MeanAt(int i) => _means[i];

    public long WeightAt(int i) => _marks[i] >> 1;

    public bool IsAtomAt(int i) => (_marks[i] & 1) == 0;

    /// <summary>The value of the trial with a rank of 1 to n.</summary>
    public double ValueAt(long rank) => ValueAtPosition(rank - 0.5);

    /// <summary>The value at a position between 0 and n.</summary>
    public double ValueAtPosition(double position)
    {
        var i = ClusterAt(position);
        return ValueWithin(i, position);
    }

    /// <summary>
    /// The standard error of a rank inside a mixed cluster: 0.4 of its weight, as measured after whole merge trees
    /// (docs/figures.md); 0 in an atom.
    /// </summary>
    public double BlurAt(long rank)
    {
        var i = ClusterAt(rank - 0.5);
        return IsAtomAt(i) ? 0 : 0.4 * WeightAt(i);
    }

    /// <summary>The standard error of the value at a rank that comes from the sketch alone.</summary>
    public double BlurOfValueAt(long rank)
    {
        var blur = BlurAt(rank);
        return blur == 0 ? 0 : 0.5 * (ValueAtPosition(Math.Min(Total, rank + blur)) - ValueAtPosition(Math.Max(0, rank - blur)));
    }

    /// <summary>How many trials lie at or below a value; whole where the neighbours are atoms.</summary>
    public double WeightAtOrBelow(double value)
    {
        var after = FirstMeanAbove(value);
        if (after == 0) return 0;
        if (after == _count) return Total;
        var i = after - 1;
        var low = IsAtomAt(i) ? _below[after] : CenterOf(i);
        var high = IsAtomAt(after) ? _below[after] : CenterOf(after);
        if (value == _means[i]) return low;
        return low + ((high - low) * Fraction(value, _means[i], _means[after]));
    }

    /// <summary>The sum of the values in the top (or bottom) of the sample that holds a mass, whole or not, of trials.</summary>
    public double TailSum(double mass, bool top)
    {
        var edge = top ? Total - mass : mass;
        var i = ClusterAt(edge);
        if (top)
        {
            var within = _below[i + 1] - edge;
            return _sumAbove[i + 1] + SumWithin(i, edge, _below[i + 1], within);
        }

        return _sumBelow[i] + SumWithin(i, _below[i], edge, edge - _below[i]);
    }

    /// <summary>The cluster that covers (below, below + weight].</summary>
    public int ClusterAt(double position)
    {
        int low = 0, high = _count - 1;
        while (low < high)
        {
            var middle = (low + high + 1) >>> 1;
            if (_below[middle] < position) low = middle;
            else high = middle - 1;
        }

        return low;
    }

    /// <summary>The positions that a cluster begins and ends at.</summary>
    public (long Begin, long End) SpanOf(int i) => (_below[i], _below[i + 1]);

    /// <summary>The value at a position inside a cluster.</summary>
    public double ValueWithin(int i, double position)
    {
        if (IsAtomAt(i)) return _means[i];
        var center = CenterOf(i);
        if (position <= center)
        {
            var left = IsAtomAt(i - 1) ? _below[i] - 0.5 : CenterOf(i - 1);
            return Between(_means[i - 1], _means[i], (position - left) / (center - left));
        }

        var right = IsAtomAt(i + 1) ? _below[i + 1] + 0.5 : CenterOf(i + 1);
        return Between(_means[i], _means[i + 1], (position - center) / (right - center));
    }

    private static double Fraction(double value, double low, double high)
    {
        var fraction = (value - low) / (high - low);
        return double.IsNaN(fraction) ? 0.5 : fraction;
    }

    private static double Between(double low, double high, double fraction)
    {
        var step = high - low;
        var value = double.IsFinite(step) ? low + (step * fraction) : (low * (1 - fraction)) + (high * fraction);
        return value < low ? low : value > high ? high : value;
    }

    /// <summary>The interpolated values of a part of a cluster, added up, and shifted so that the whole has its mean.</summary>
    private double SumWithin(int i, double from, double to, double mass)
    {
        if (mass <= 0) return 0;
        if (IsAtomAt(i) || mass >= WeightAt(i)) return mass * _means[i];
        var shift = _means[i] - (Integral(i, _below[i], _below[i + 1]) / WeightAt(i));
        return Integral(i, from, to) + (mass * shift);
    }

    private double Integral(int i, double from, double to)
    {
        var center = CenterOf(i);
        if (from < center && center < to) return Trapezoid(i, from, center) + Trapezoid(i, center, to);
        return Trapezoid(i, from, to);
    }

    private double Trapezoid(int i, double from, double to) =>
        (to - from) * ((0.5 * ValueWithin(i, from)) + (0.5 * ValueWithin(i, to)));

    private double CenterOf(int i) => 0.5 * (_below[i] + _below[i + 1]);

    private int FirstMeanAbove(double value)
    {
        int low = 0, high = _count;
        while (low < high)
        {
            var middle = (low + high) >>> 1;
            if (_means[middle] <= value) low = middle + 1;
            else high = middle;
        }

        return low;
    }
}
