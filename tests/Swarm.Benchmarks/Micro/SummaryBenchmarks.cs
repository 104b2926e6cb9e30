using BenchmarkDotNet.Attributes;
using Swarm.Engine;
using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;
using Swarm.Engine.Summaries;

namespace Swarm.Benchmarks.Micro;

/// <summary>Moments, exceedances and sketch of one outcome in one leaf; the baseline sorts the leaf, and does no more.</summary>
public class SummaryBenchmarks
{
    private const long TrialsOfRun = 1 << 24;
    private readonly double[] _values = new double[Edition.TrialsPerLeaf];
    private readonly double[] _sorted = new double[Edition.TrialsPerLeaf];
    private readonly SummaryPool _pool = new();
    private readonly OutcomeRequest _request = new("outcome", Adverse.High, [0.5, 0.75, 0.9, 0.95, 0.99, 0.995], [1, 2]);
    private LeafSummariser _summariser = null!;

    [GlobalSetup]
    public void Draw()
    {
        new Lognormal(0, 0.5).Fill(new DrawSlice(StreamKey.Of(1, "draw", "leaf"), 0, 1, LaneWidths.OfThisMachine), _values);
        _summariser = new LeafSummariser(new RunShape(TrialsOfRun), _pool);
        OutcomeSummary summary = _summariser.Summarise(_values, _request);
        if (summary.Moments.Max != _values.Max())
            throw new InvalidOperationException("the greatest value is not that of the leaf");
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Edition.TrialsPerLeaf)]
    public void Sort()
    {
        _values.CopyTo(_sorted, 0);
        Array.Sort(_sorted);
    }

    [Benchmark(OperationsPerInvoke = Edition.TrialsPerLeaf)]
    public void Summarise() => _pool.Return([_summariser.Summarise(_values, _request)]);
}
