using System.Runtime.CompilerServices;

namespace Swarm.Engine.Summaries;

/// <summary>
/// A monotone map from values to bins, each of which is to hold a part of one cluster. It is linear in coarse cells, and cut
/// again, linearly, inside each of them by what a subsample of the leaf shows. It decides how quickly and how finely a leaf is
/// sketched, not whether the sketch is right.
/// </summary>
internal sealed unsafe class ValueMap
{
    /// <summary>Coarse cells, counted from 1.</summary>
    public const int Cells = 512;

    /// <summary>The cell and the bin of what is not mapped.</summary>
    public const int Nowhere = 0;

    /// <summary>The last number that still lies in the last cell.</summary>
    public const double LastPosition = Cells + 1 - (1.0 / (1L << 43));

    private const int Stride = 8;
    private const int Group = 8;
    private const int FewestCells = 100;
    private const int MostZooms = 10;
    private const double TailShare = 0.0125;
    private readonly BinDensity _density = new();
    private readonly int[] _sample = new int[Cells + 2];
    private double _low;
    private double _width;

    /// <summary>First bin and number of bins of each cell.</summary>
    public (double First, double Bins)[] Segments { get; } = new (double, double)[Cells + 1];

    /// <summary>The value at which cell 1 begins.</summary>
    public double Origin => _low;

    /// <summary>Cells for each unit of value.</summary>
    public double Scale { get; private set; }

    /// <summary>Values below belong to the lower tail; minus infinity if there is none.</summary>
    public double LowerEdge { get; private set; }

    /// <summary>Values above belong to the upper tail; infinity if there is none.</summary>
    public double UpperEdge { get; private set; }

    /// <summary>Bins, with bin 0 for what is not mapped.</summary>
    public int Bins { get; private set; }

    /// <summary>
    /// Fits the map to values between two ends, which in the sorted leaf lie above so many trials. False where no linear map can
    /// be had: a range beyond a double, or too narrow for one.
    /// </summary>
    public bool Fit(ReadOnlySpan<double> values, double min, double max, long before, long leaf)
    {
        var sampled = values.Length / (double)Stride;
        var tail = TailShare * leaf;
        var lowerTail = Math.Max(0, tail - before) / Stride;
        var upperTail = Math.Max(0, tail - (leaf - before - values.Length)) / Stride;
        _low = min;
        _width = (max / Cells) - (min / Cells);
        int first, last;
        double below, above;
        for (var zoom = 0; ; zoom++)
        {
            Scale = 1 / _width;
            if (!(_width > 0) || !double.IsFinite(Scale) || !double.IsFinite(_width * Cells)) return false;
            CountSample(values);
            (first, below) = CellAt(lowerTail, fromBelow: true);
            (last, above) = CellAt(upperTail, fromBelow: false);
            if (last - first >= FewestCells || zoom == MostZooms) break;
            _low += _width * (first - 1);
            _width = _width * Math.Max(1, last - first + 1) / Cells;
        }

        if (last < first) return false;
        LowerEdge = lowerTail > 0 ? _low + (_width * (first - 1 + Part(lowerTail - below, first))) : double.NegativeInfinity;
        UpperEdge = upperTail > 0 ? _low + (_width * (last - Part(upperTail - above, last))) : double.PositiveInfinity;
        Cut(first, last, before + (long)(below * Stride), leaf);
        return true;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void CountSample(ReadOnlySpan<double> values)
    {
        Array.Clear(_sample);
        var scale = Scale;
        var low = _low;
        fixed (double* first = values)
        fixed (int* sample = _sample)
        {
            for (var i = 0; i <= values.Length - Group; i += Group * Stride)
            {
                for (var k = 0; k < Group; k++)
                {
                    var position = double.MinNative(Cells + 1, double.MaxNative(0, ((first[i + k] - low) * scale) + 1));
                    sample[double.ConvertToIntegerNative<int>(position)]++;
                }
            }
        }
    }

    /// <summary>The first cell, from one end, in which the sample passes a count, and the count before it.</summary>
    private (int Cell, double Before) CellAt(double passed, bool fromBelow)
    {
        var step = fromBelow ? 1 : -1;
        var cell = fromBelow ? 1 : Cells;
        double before = _sample[fromBelow ? 0 : Cells + 1];
        for (var k = 1; k < Cells && before + _sample[cell] <= passed; k++)
        {
            before += _sample[cell];
            cell += step;
        }

        return (cell, before);
    }

    private double Part(double trials, int cell) =>
        _sample[cell] == 0 ? 0 : Math.Clamp(trials / _sample[cell], 0, 1);

    private void Cut(int first, int last, long rank, long leaf)
    {
        _density.Prepare(leaf);
        double bins = 1;
        for (var cell = 1; cell <= Cells; cell++)
        {
            if (cell < first || cell > last)
            {
                Segments[cell] = (cell < first ? 1 : bins - 1, 0);
                continue;
            }

            var trials = _sample[cell] * Stride;

            // One group more than the sample shows: a cell that it missed by chance must not crowd its bins.
            var wanted = Math.Floor((trials + Stride) * _density.At(rank + (trials / 2))) + 1;
            rank += trials;
            Segments[cell] = (bins, wanted);
            bins += wanted;
        }

        Bins = (int)bins + 1;
    }
}
