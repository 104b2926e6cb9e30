using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>
/// Sketches the values of one leaf without sorting them all: the tails are sorted, the bulk is counted in bins. Values that
/// repeat, at the ends or everywhere, stay exact atoms. The sketch is a function of the leaf's values in their order alone.
/// Scratch memory of one thread.
/// </summary>
internal sealed class LeafSketch(LaneWidth width)
{
    private const int FewValues = 1024;
    private const int AtomsFrom = 64;
    private readonly double[] _interior = new double[Edition.TrialsPerLeaf];
    private readonly ValueMap _map = new();
    private readonly LeafBins _bins = new();
    private readonly CrowdedBins _crowded = new();
    private readonly BinDensity _density = new();
    private readonly ExactValues _exact = new();
    private readonly TailSort _tailSort = new();

    /// <summary>Hands the clusters of the values to the builder.</summary>
    public void Sketch(ReadOnlySpan<double> values, double min, double max, DigestBuilder builder)
    {
        builder.Begin(Edition.TrialsPerLeaf);
        var least = (int)MomentKernel.CountEqual(values, min, width);
        if (least == values.Length)
        {
            builder.Add(min, least, true);
            return;
        }

        var greatest = (int)MomentKernel.CountEqual(values, max, width);
        if (Math.Max(least, greatest) < values.Length / AtomsFrom)
        {
            Inner(values, min, max, 0, values.Length, builder);
            return;
        }

        // Layers and floors: many trials at the least or greatest value. What lies between is sketched alone.
        builder.Add(min, least, true);
        var interior = Between(values, min, max);
        if (interior.Length > 0)
        {
            var (low, high) = MomentKernel.ExtremesOf(interior, width);
            Inner(interior, low, high, least, values.Length, builder);
        }

        builder.Add(max, greatest, true);
    }

    private void Inner(ReadOnlySpan<double> values, double min, double max, int before, int leaf, DigestBuilder builder)
    {
        if (values.Length < FewValues)
        {
            _exact.AddSorted(values, builder);
            return;
        }

        if (_exact.LooksDistinct(values) && _exact.TryAddDistinct(values, builder)) return;
        if (min == max || !_map.Fit(values, min, max, before, leaf))
        {
            if (!_exact.TryAddDistinct(values, builder)) _exact.AddSorted(values, builder);
            return;
        }

        _bins.Spread(values, _map, width);
        _tailSort.Sort(_bins.Lower, _map.LowerEdge);
        _tailSort.Sort(_bins.Upper, _map.UpperEdge);
        if ((HasRepeats(_bins.Lower) || HasRepeats(_bins.Upper)) && _exact.TryAddDistinct(values, builder)) return;
        FindCrowds(before + _bins.Lower.Length, leaf);
        _crowded.Gather(values, _bins.Places);
        ExactValues.AddRuns(_bins.Lower, builder);
        AddBins(builder);
        ExactValues.AddRuns(_bins.Upper, builder);
    }

    private Span<double> Between(ReadOnlySpan<double> values, double min, double max)
    {
        var kept = 0;
        foreach (var x in values)
        {
            _interior[kept] = x;
            kept += x > min && x < max ? 1 : 0;
        }

        return _interior.AsSpan(0, kept);
    }

    private static bool HasRepeats(ReadOnlySpan<double> sorted)
    {
        for (var i = 1; i < sorted.Length; i++)
        {
            if (sorted[i] == sorted[i - 1]) return true;
        }

        return false;
    }

    private void FindCrowds(long rank, int leaf)
    {
        _crowded.Begin(_map.Bins);
        _density.Prepare(leaf);
        for (var bin = 1; bin < _map.Bins; bin++)
        {
            var count = _bins.Bins[bin].Count;
            if (count > _density.Crowd(rank)) _crowded.Mark(bin, count);
            rank += count;
        }
    }

    private void AddBins(DigestBuilder builder)
    {
        for (var bin = 1; bin < _map.Bins; bin++)
        {
            var count = _bins.Bins[bin].Count;
            if (count == 0) continue;
            var crowd = _crowded.ValuesOf(bin, count);
            if (crowd.Length == 0)
            {
                var sum = _bins.Bins[bin].Sum;
                if (count == 1) builder.AddExact(sum, 1);
                else builder.AddRounded(sum / count, count);
                continue;
            }

            CrowdedBins.Sort(crowd);
            ExactValues.AddRuns(crowd, builder);
        }
    }
}
