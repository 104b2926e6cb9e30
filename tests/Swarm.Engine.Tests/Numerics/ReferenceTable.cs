using System.Globalization;

namespace Swarm.Engine.Tests.Numerics;

/// <summary>The rows of Data/elementary-*.csv, written by Data/elementary.py beside them.</summary>
internal sealed class ReferenceTable
{
    private readonly double[][] _rows;

    private ReferenceTable(double[][] rows) => _rows = rows;

    public int Count => _rows.Length;

    public static ReferenceTable Read(string function)
    {
        var path = Path.Combine(AppContext.BaseDirectory, "Data", $"elementary-{function}.csv");
        return new ReferenceTable(
            [.. File.ReadLines(path).Skip(1).Select(line =>
                line.Split(',').Select(cell => double.Parse(cell, CultureInfo.InvariantCulture)).ToArray())]);
    }

    public double[] Arguments(int column) => [.. _rows.Select(row => row[column])];

    public double Rounded(int row) => _rows[row][^2];

    /// <summary>Distance of a computed value from the exact one, in units of the last place of the exact one.</summary>
    public double ErrorInUlp(int row, double computed)
    {
        var rounded = Rounded(row);
        var ulp = Math.BitIncrement(Math.Abs(rounded)) - Math.Abs(rounded);
        return Math.Abs(((computed - rounded) / ulp) - _rows[row][^1]);
    }

    public (double Error, double[] Row) Worst(ReadOnlySpan<double> computed)
    {
        var worst = (Error: 0.0, Row: _rows[0]);
        for (var i = 0; i < Count; i++)
        {
            var error = ErrorInUlp(i, computed[i]);
            if (!(error <= worst.Error))
                worst = (error, _rows[i]);
        }

        return worst;
    }
}
