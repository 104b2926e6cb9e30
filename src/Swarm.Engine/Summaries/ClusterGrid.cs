namespace Swarm.Engine.Summaries;

/// <summary>
/// The ranks from 0 to n, cut into cells as wide as the <see cref="ScaleFunction"/> allows, the same from both ends. Trials whose
/// clusters have their middle in one cell make one cluster. A fixed grid fills its clusters evenly, where a greedy cut leaves
/// them two thirds full, and costs no root for each cluster.
/// </summary>
internal sealed class ClusterGrid
{
    private readonly long[] _bounds;

    public ClusterGrid(long count)
    {
        Count = count;
        var lower = new List<double>();
        var scale = new ScaleFunction(count);
        var half = count / 2.0;
        for (var rank = 1.0; rank < half; rank += scale.LimitAt(rank + (scale.LimitAt(rank) / 2))) lower.Add(rank);

        // Twice the rank, so that a middle, which may lie at a half, is a whole number too.
        _bounds = new long[(2 * lower.Count) + 1];
        for (var cell = 0; cell < lower.Count; cell++)
        {
            _bounds[cell] = (long)(2 * lower[cell]);
            _bounds[^(cell + 2)] = (2 * count) - _bounds[cell];
        }

        _bounds[^1] = long.MaxValue;
    }

    /// <summary>Trials.</summary>
    public long Count { get; }

    /// <summary>Twice the rank that each cell ends before; the last has no end.</summary>
    public ReadOnlySpan<long> DoubledBounds => _bounds;
}
