namespace Swarm.Engine.Summaries;

/// <summary>How many bins a trial calls for, by its rank in the leaf.</summary>
internal sealed class BinDensity
{
    private const double BinsPerCluster = 1.6;
    private const int Steps = 256;
    private const int Mask = (2 * Steps) - 1;
    private readonly double[] _density = new double[2 * Steps];
    private readonly int[] _crowd = new int[2 * Steps];
    private long _leaf;
    private double _step;

    public void Prepare(long leaf)
    {
        if (_leaf == leaf) return;
        _leaf = leaf;
        _step = (double)Steps / leaf;
        var scale = new ScaleFunction(leaf);
        for (var i = 0; i <= Mask; i++)
        {
            var limit = scale.LimitAt(Math.Min(i, Steps) / _step);
            _density[i] = BinsPerCluster / limit;
            _crowd[i] = 12 + (int)(2 * limit);
        }
    }

    public double At(long rank) => _density[(int)(rank * _step) & Mask];

    /// <summary>More trials than this crowd a bin that begins at a rank.</summary>
    public int Crowd(long rank) => _crowd[(int)(rank * _step) & Mask];
}
