namespace Swarm.Engine.Reserving;

/// <summary>
/// The link ratios of a triangle, and which of them count. The ratio (i, j) leads from development j to j + 1 of origin i, both
/// from 0.
/// </summary>
public sealed class LinkRatios
{
    private readonly double[][] _cumulative;
    private readonly bool[][] _counts;

    internal LinkRatios(Triangle triangle, ReservingOptions options)
    {
        Triangle = triangle;
        int origins = triangle.Origins.Count;
        _cumulative = new double[origins][];
        _counts = new bool[origins][];
        int latestPeriod = origins + triangle.Known(origins - 1) - 2;
        for (int i = 0; i < origins; i++)
        {
            _cumulative[i] = RunningSums(triangle, i);
            _counts[i] = new bool[Math.Max(0, triangle.Known(i) - 1)];
            for (int j = 0; j < _counts[i].Length; j++)
            {
                int age = latestPeriod - (i + j + 1);
                _counts[i][j] = age < (options.LastPeriods ?? int.MaxValue) && !options.Excluded.Contains((i, j));
            }
        }
    }

    /// <summary>The triangle.</summary>
    public Triangle Triangle { get; }

    /// <summary>Cumulative amount of a known cell.</summary>
    public double Cumulative(int origin, int development) => _cumulative[origin][development];

    /// <summary>The ratio of two neighbouring cumulative amounts; not finite where the first is 0.</summary>
    public double Ratio(int origin, int development) => _cumulative[origin][development + 1] / _cumulative[origin][development];

    /// <summary>True if both cells are known and the ratio is neither excluded nor older than the last periods asked for.</summary>
    public bool IsCounted(int origin, int development) =>
        development < _counts[origin].Length && _counts[origin][development];

    /// <summary>Origins whose ratio counts at a development.</summary>
    public IEnumerable<int> CountedAt(int development)
    {
        for (int i = 0; i < _counts.Length; i++)
        {
            if (IsCounted(i, development))
            {
                yield return i;
            }
        }
    }

    /// <summary>Number of ratios that count at a development.</summary>
    public int CountAt(int development) => CountedAt(development).Count();

    /// <summary>True if every known ratio counts.</summary>
    public bool AllCount => Array.TrueForAll(_counts, row => Array.TrueForAll(row, counts => counts));

    private static double[] RunningSums(Triangle triangle, int origin)
    {
        double[] sums = new double[triangle.Known(origin)];
        double sum = 0;
        for (int j = 0; j < sums.Length; j++)
        {
            sum += triangle.Incremental(origin, j);
            sums[j] = sum;
        }

        return sums;
    }
}
