namespace Swarm.Engine.Summaries;

/// <summary>Sketches the values of one leaf. Holds scratch memory: one a thread.</summary>
internal sealed class LeafSketch
{
    private double[] _sorted = [];

    /// <summary>Writes the clusters of the values into the builder.</summary>
    public void Sketch(ReadOnlySpan<double> values, DigestBuilder builder)
    {
        if (_sorted.Length < values.Length) _sorted = new double[values.Length];
        var sorted = _sorted.AsSpan(0, values.Length);
        values.CopyTo(sorted);
        sorted.Sort();
        builder.Begin(values.Length);
        for (var i = 0; i < sorted.Length; i++) builder.Add(sorted[i] + 0.0, 1, true);
    }
}
