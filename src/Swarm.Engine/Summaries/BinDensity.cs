namespace Swarm.Engine.Summaries;

/// <summary>How many bins a trial calls for, by its rank in the leaf.</summary>
internal sealed class BinDensity
{
    private const double BinsPerCluster = 1.6;
    private const int Steps = 256;
    private readonly double[] _density = new double[Steps + 1];
    private long _leaf;
    private double _step;

    public void Prepare(long leaf)
    {
        if (_leaf == leaf) return;
        _leaf = leaf;
        _step = (double)Steps / leaf;
        var scale = new ScaleFunction(leaf);
        for (var i = 0; i <= Steps; i++) _density[i] = BinsPerCluster / scale.LimitAt(i / _step);
    }

    public double At(long rank) => _density[Math.Clamp((int)(rank * _step), 0, Steps)];

    /// <summary>More trials than this crowd a bin that begins at a rank.</summary>
    public double Crowd(long rank) => 4 + (2 * BinsPerCluster / At(rank));
}
