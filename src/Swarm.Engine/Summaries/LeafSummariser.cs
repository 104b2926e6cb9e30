using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>Turns the values of one outcome in one leaf into its summary. Holds scratch memory: one a thread.</summary>
public sealed class LeafSummariser
{
    private readonly SummaryPool _pool;
    private readonly LaneWidth _width;
    private readonly bool _blocks;
    private readonly DigestBuilder _builder = new();
    private readonly LeafSketch _sketch;
    private readonly BlockFigures _blockFigures;

    /// <summary>A summariser at the machine's own vector width.</summary>
    /// <param name="shape">The run's shape, which says whether single blocks need figures.</param>
    /// <param name="pool">Where summaries come from.</param>
    public LeafSummariser(RunShape shape, SummaryPool pool)
        : this(shape, pool, LaneWidths.OfThisMachine)
    {
    }

    internal LeafSummariser(RunShape shape, SummaryPool pool, LaneWidth width)
    {
        _pool = pool;
        _width = width;
        _blocks = shape.BatchesAreBlocks;
        _sketch = new LeafSketch(width);
        _blockFigures = new BlockFigures(width);
    }

    /// <summary>The summary of a leaf's values; the same bits at every vector width.</summary>
    /// <param name="values">One value a trial, in order; a whole leaf, or what the run's end leaves of it. All finite.</param>
    /// <param name="request">What is asked of the outcome.</param>
    /// <exception cref="ArgumentException">There is no value, more than a leaf holds, or one is not finite.</exception>
    public OutcomeSummary Summarise(ReadOnlySpan<double> values, OutcomeRequest request)
    {
        if (values.Length is < 1 or > Edition.TrialsPerLeaf)
            throw new ArgumentException($"A leaf has 1 to {Edition.TrialsPerLeaf} trials, not {values.Length}.");
        var moments = MomentKernel.Of(values, _width);
        if (!double.IsFinite(moments.Min) || !double.IsFinite(moments.Max) || double.IsNaN(moments.Mean))
            throw new ArgumentException($"A value of outcome '{request.Name}' is not finite.");
        _sketch.Sketch(values, moments.Min, moments.Max, _builder);
        var summary = _pool.Rent(_builder.Join());
        _builder.CopyTo(summary.Digest);
        summary.Moments = moments;
        var exceedances = summary.ExceedancesFor(request.Thresholds.Count);
        for (var i = 0; i < exceedances.Length; i++)
            exceedances[i] = MomentKernel.CountAbove(values, request.Thresholds[i], _width);
        summary.Blocks = _blocks ? _blockFigures.Of(values, request) : [];
        return summary;
    }
}
