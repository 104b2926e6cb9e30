using Swarm.Engine.Numerics;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

/// <summary>Runs over given values, folded as the engine folds them.</summary>
internal static class FoldedRuns
{
    public static readonly OutcomeRequest Plain = new("outcome", Adverse.High, [0.99, 0.995], []);

    public static OutcomeResult Fold(ReadOnlySpan<double> values, OutcomeRequest request, LaneWidth? width = null)
    {
        var pool = new SummaryPool();
        var reduction = new RunReduction(values.Length, [request], pool);
        var summariser = new LeafSummariser(reduction.Shape, pool, width ?? LaneWidths.OfThisMachine);
        for (long leaf = 0; leaf < reduction.Shape.Leaves; leaf++)
            reduction.Accept(0, leaf, [summariser.Summarise(LeafOf(values, leaf), request)]);
        return reduction.Finish()[0];
    }

    public static ReadOnlySpan<double> LeafOf(ReadOnlySpan<double> values, long leaf)
    {
        var from = (int)(leaf * Edition.TrialsPerLeaf);
        return values.Slice(from, Math.Min(Edition.TrialsPerLeaf, values.Length - from));
    }
}
