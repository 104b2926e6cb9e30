using System.Runtime.InteropServices;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>One thread's means to compute leaves: an executor, room for a leaf's values, a summariser.</summary>
internal sealed unsafe class LeafRunner : IDisposable
{
    private const int CacheLine = 64;

    private readonly PreparedRun _run;
    private readonly PlanExecutor _executor;
    private readonly LeafSummariser _summariser;
    private readonly double* _values;

    public LeafRunner(PreparedRun run)
    {
        _run = run;
        _summariser = new LeafSummariser(run.Shape, run.Pool, run.Settings.Width);
        _executor = PlanExecutor.Create(run.Compiled.Running, run.Settings.Width);
        nuint doubles = (nuint)run.Outcomes.Count * Edition.TrialsPerLeaf;
        _values = (double*)NativeMemory.AlignedAlloc(doubles * sizeof(double), CacheLine);
    }

    /// <summary>Trials of the run so far, by component, for which the component had to draw again.</summary>
    public long Redrawn(int component)
    {
        // The plan lists components in the order of their first use, and not those that no outcome needs.
        int kernel = Array.FindIndex(_run.Compiled.Running.Components, used => used.Component == _run.Components[component]);
        return kernel < 0 ? 0 : _executor.Kernels[kernel].Redrawn;
    }

    /// <summary>Computes a leaf's values; the last leaf of a run may hold fewer trials than the others.</summary>
    /// <returns>The fault of the lowest trial, or null.</returns>
    public TileFault? Compute(long leaf)
    {
        long firstTrial = leaf * Edition.TrialsPerLeaf;
        int live = _run.TrialsOfLeaf(leaf);
        TileFault? fault = null;
        for (int start = 0; start < live; start += PlanExecutor.TileTrials)
        {
            fault ??= _executor.RunTile(firstTrial + start, live - start, _values + start, Edition.TrialsPerLeaf);
        }

        return fault;
    }

    /// <summary>Summarises the leaf that was computed last: one summary an outcome.</summary>
    public OutcomeSummary[] Summarise(long leaf)
    {
        int live = _run.TrialsOfLeaf(leaf);
        var summaries = new OutcomeSummary[_run.Outcomes.Count];
        for (int i = 0; i < summaries.Length; i++)
        {
            var values = new ReadOnlySpan<double>(_values + ((nint)i * Edition.TrialsPerLeaf), live);
            summaries[i] = _summariser.Summarise(values, _run.Outcomes[i].Request);
        }

        return summaries;
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        _executor.Dispose();
        NativeMemory.AlignedFree(_values);
    }
}
