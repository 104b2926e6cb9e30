namespace Swarm.Cli.Plots;

/// <summary>
/// A smooth curve through rising points that rises between them, too (Fritsch &amp; Carlson 1980, with the slopes of
/// Fritsch &amp; Butland 1984).
/// </summary>
internal sealed class MonotoneCubic
{
    private readonly double[] _x;
    private readonly double[] _y;
    private readonly double[] _slopes;

    /// <summary>The curve through points whose abscissae rise strictly.</summary>
    public MonotoneCubic(double[] x, double[] y)
    {
        (_x, _y) = (x, y);
        double[] secants = [.. Enumerable.Range(0, x.Length - 1).Select(i => (y[i + 1] - y[i]) / (x[i + 1] - x[i]))];
        _slopes = [secants[0], .. Enumerable.Range(1, x.Length - 2).Select(i => SlopeAt(i, secants)), secants[^1]];
    }

    /// <summary>The curve's height; outside of the points, that of the nearest end.</summary>
    public double At(double x)
    {
        if (x <= _x[0]) return _y[0];
        if (x >= _x[^1]) return _y[^1];
        var found = Array.BinarySearch(_x, x);
        var i = found >= 0 ? Math.Min(found, _x.Length - 2) : ~found - 1;
        var width = _x[i + 1] - _x[i];
        var t = (x - _x[i]) / width;
        var s = 1 - t;
        return (_y[i] * (1 + (2 * t)) * s * s) + (_slopes[i] * width * t * s * s)
            + (_y[i + 1] * t * t * (3 - (2 * t))) - (_slopes[i + 1] * width * t * t * s);
    }

    /// <summary>The weighted harmonic mean of both neighbours' secants; zero beside a flat piece.</summary>
    private double SlopeAt(int i, double[] secants)
    {
        var (before, after) = (secants[i - 1], secants[i]);
        if (before <= 0 || after <= 0) return 0;
        var (left, right) = (_x[i] - _x[i - 1], _x[i + 1] - _x[i]);
        var share = (left + (2 * right)) / (3 * (left + right));
        return before * after / ((share * after) + ((1 - share) * before));
    }
}
