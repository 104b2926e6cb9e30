namespace Swarm.Engine.Reserving;

/// <summary>
/// The deterministic chain ladder: development factors, ultimate amounts, reserves and the means of all future cells. The base
/// of both stochastic methods.
/// </summary>
public sealed class ChainLadder
{
    private readonly double[] _factors;
    private readonly double[][] _future;

    private ChainLadder(LinkRatios ratios, ReservingOptions options, double[] factors, Tail? tail)
    {
        Ratios = ratios;
        Options = options;
        Tail = tail;
        _factors = factors;
        _future = [.. Enumerable.Range(0, Triangle.Origins.Count).Select(RunOff)];
    }

    /// <summary>The triangle.</summary>
    public Triangle Triangle => Ratios.Triangle;

    /// <summary>Its link ratios.</summary>
    public LinkRatios Ratios { get; }

    /// <summary>The options in use.</summary>
    public ReservingOptions Options { get; }

    /// <summary>Development beyond the triangle, or null.</summary>
    public Tail? Tail { get; }

    /// <summary>Factor j leads from development j to j + 1, both from 0; the tail is not among them.</summary>
    public IReadOnlyList<double> Factors => _factors;

    /// <summary>Number of columns beyond the triangle.</summary>
    public int TailPeriods => Tail?.Shares.Count ?? 0;

    /// <summary>Number of calendar periods in which something is still paid.</summary>
    public int FuturePeriods => Triangle.Developments + TailPeriods - Triangle.Known(Triangle.Origins.Count - 1);

    /// <summary>Sum of all reserves.</summary>
    public double TotalReserve
    {
        get
        {
            double sum = 0;
            for (int i = 0; i < _future.Length; i++)
            {
                sum += Reserve(i);
            }

            return sum;
        }
    }

    /// <summary>Amount that is still to be paid of an origin.</summary>
    public double Reserve(int origin)
    {
        double sum = 0;
        foreach (double increment in _future[origin])
        {
            sum += increment;
        }

        return sum;
    }

    /// <summary>Amount that an origin will finally have cost.</summary>
    public double Ultimate(int origin) => Triangle.Latest(origin) + Reserve(origin);

    /// <summary>Mean of a future cell; developments from <see cref="Triangle.Developments"/> on are those of the tail.</summary>
    public double FutureIncrement(int origin, int development) => _future[origin][development - Triangle.Known(origin)];

    /// <summary>Mean of what is paid in a future calendar period (from 0): the payment pattern.</summary>
    public double PaidIn(int period)
    {
        double sum = 0;
        foreach (double[] row in _future)
        {
            sum += period < row.Length ? row[period] : 0;
        }

        return sum;
    }

    /// <summary>All future cells, origin by origin, each in order of development.</summary>
    public IEnumerable<FutureCell> FutureCells() =>
        from i in Enumerable.Range(0, _future.Length)
        from k in Enumerable.Range(0, _future[i].Length)
        select new FutureCell(i, Triangle.Known(i) + k, k, _future[i][k]);

    /// <summary>The fit, or null after an error was added to the findings.</summary>
    public static ChainLadder? Fit(Triangle triangle, ReservingOptions options, ICollection<Finding> findings)
    {
        if (!ReservingRules.Hold(triangle, options, findings))
        {
            return null;
        }

        var ratios = new LinkRatios(triangle, options);
        double[]? factors = DevelopmentFactors.Of(ratios, options.Average, findings);
        if (factors is null)
        {
            return null;
        }

        Tail? tail = options.Tail is null ? null : Tail.Of(options.Tail, factors, findings);
        return options.Tail is not null && tail is null ? null : new ChainLadder(ratios, options, factors, tail);
    }

    private double[] RunOff(int origin)
    {
        int known = Triangle.Known(origin);
        var future = new double[Triangle.Developments - known + TailPeriods];
        double cumulative = Ratios.Cumulative(origin, known - 1);
        int next = 0;
        for (int j = known - 1; j < _factors.Length; j++)
        {
            double after = cumulative * _factors[j];
            future[next++] = after - cumulative;
            cumulative = after;
        }

        for (int k = 0; k < TailPeriods; k++)
        {
            future[next++] = cumulative * (Tail!.Factor - 1) * Tail.Shares[k];
        }

        return future;
    }
}
