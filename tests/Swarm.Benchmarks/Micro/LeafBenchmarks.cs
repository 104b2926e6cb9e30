using BenchmarkDotNet.Attributes;
using Swarm.Engine;
using Swarm.Engine.Models;
using Swarm.Engine.Plans;

namespace Swarm.Benchmarks.Micro;

/// <summary>
/// A leaf of the models that are timed against the peers, a trial at a time: the trials alone, and with the summaries of every
/// outcome. The ratio less one, over the ratio, is the summaries' share of a run.
/// </summary>
public class LeafBenchmarks : IDisposable
{
    private const long TrialsOfRun = 1 << 24;
    private PreparedRun _run = null!;
    private LeafRunner _runner = null!;
    private long _leaf;

    [Params("bootstrap", "fund")]
    public string Workload { get; set; } = "";

    [GlobalSetup]
    public void Prepare()
    {
        string folder = PeersFolder();
        string document = Path.Combine(folder, Workload + ".yaml");
        ModelReading reading = ModelReader.Read(
            document, File.ReadAllText(document), name => new DataFile(name, File.ReadAllBytes(Path.Combine(folder, name))));
        _run = new PreparedRun(reading.Model!, new RunSettings { Trials = TrialsOfRun, Threads = 1 });
        _runner = new LeafRunner(_run);
        if (_runner.Compute(0) is not null)
            throw new InvalidOperationException("the first leaf has a fault");
    }

    [GlobalCleanup]
    public void Dispose()
    {
        _runner.Dispose();
        GC.SuppressFinalize(this);
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Edition.TrialsPerLeaf)]
    public void Trials() => _runner.Compute(NextLeaf());

    [Benchmark(OperationsPerInvoke = Edition.TrialsPerLeaf)]
    public void TrialsAndSummaries()
    {
        long leaf = NextLeaf();
        _runner.Compute(leaf);
        _run.Pool.Return(_runner.Summarise(leaf));
    }

    private long NextLeaf() => _leaf = (_leaf + 1) % _run.Leaves;

    private static string PeersFolder()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "Swarm.sln")))
            folder = folder.Parent;
        return Path.Combine(folder?.FullName ?? throw new DirectoryNotFoundException("no Swarm.sln above"), "tests", "peers");
    }
}
