namespace Swarm.Engine.Reserving;

/// <summary>A run-off triangle: incremental amounts by origin period (row) and development period (column).</summary>
public sealed class Triangle
{
    private readonly double[][] _incremental;

    /// <summary>Wraps a checked triangle.</summary>
    /// <param name="origins">Labels of the origin periods, oldest first (2017, or 2017Q3).</param>
    /// <param name="incremental">Row i holds the known increments of origin i, first development first; row lengths never grow.</param>
    /// <param name="monthsPerPeriod">12 for yearly, 3 for quarterly periods.</param>
    public Triangle(IReadOnlyList<string> origins, double[][] incremental, int monthsPerPeriod)
    {
        ArgumentOutOfRangeException.ThrowIfNotEqual(incremental.Length, origins.Count);
        Origins = origins;
        _incremental = incremental;
        MonthsPerPeriod = monthsPerPeriod;
        Developments = incremental.Max(row => row.Length);
    }

    /// <summary>Labels of the origin periods, oldest first.</summary>
    public IReadOnlyList<string> Origins { get; }

    /// <summary>Number of development periods (columns).</summary>
    public int Developments { get; }

    /// <summary>12 for yearly, 3 for quarterly periods.</summary>
    public int MonthsPerPeriod { get; }

    /// <summary>Number of known cells of an origin.</summary>
    public int Known(int origin) => _incremental[origin].Length;

    /// <summary>Amount that fell in one development period (from 0) of one origin (from 0).</summary>
    public double Incremental(int origin, int development) => _incremental[origin][development];

    /// <summary>Sum of the increments up to and with a development period.</summary>
    public double Cumulative(int origin, int development)
    {
        double sum = 0;
        for (int j = 0; j <= development; j++)
        {
            sum += _incremental[origin][j];
        }

        return sum;
    }

    /// <summary>Amount to date of an origin: its cell on the latest diagonal, or the last column's.</summary>
    public double Latest(int origin) => Cumulative(origin, Known(origin) - 1);

    /// <summary>Number of origins that are known at a development period; always the oldest ones.</summary>
    public int RowsAt(int development)
    {
        int rows = 0;
        while (rows < Origins.Count && Known(rows) > development)
        {
            rows++;
        }

        return rows;
    }

    /// <summary>A cell's name in messages, with the development period's number from 1.</summary>
    internal string CellName(int origin, int development) => $"origin {Origins[origin]}, development {development + 1}";
}
