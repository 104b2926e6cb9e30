using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>The batch figures of the whole blocks in a leaf of a small run, from the exactly sorted values.</summary>
internal sealed class BlockFigures(LaneWidth width)
{
    private readonly double[] _sorted = new double[Edition.TrialsPerBlock];
    private readonly long[] _marks = new long[Edition.TrialsPerBlock];
    private readonly TDigest _digest = new(Edition.TrialsPerBlock);
    private readonly DigestIndex _index = new();

    public BatchFigures[] Of(ReadOnlySpan<double> leaf, OutcomeRequest request)
    {
        var levels = BatchLevels.For(request);
        var figures = new BatchFigures[leaf.Length / Edition.TrialsPerBlock];
        for (var block = 0; block < figures.Length; block++)
            figures[block] = OfBlock(leaf.Slice(block * Edition.TrialsPerBlock, Edition.TrialsPerBlock), request, levels);
        return figures;
    }

    private BatchFigures OfBlock(ReadOnlySpan<double> values, OutcomeRequest request, double[] levels)
    {
        values.CopyTo(_sorted);
        Array.Sort(_sorted);
        Array.Fill(_marks, TDigest.Mark(1, atom: true));
        _digest.Assign(_sorted, _marks, values.Length);
        _index.Read(_digest);
        var exceedances = new long[request.Thresholds.Count];
        for (var i = 0; i < exceedances.Length; i++) exceedances[i] = MomentKernel.CountAbove(values, request.Thresholds[i], width);
        return BatchFigures.Of(MomentKernel.Of(values, width), exceedances, _index, request, levels);
    }
}
