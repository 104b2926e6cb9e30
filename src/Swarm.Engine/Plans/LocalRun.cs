using Swarm.Engine.Models;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Plans;

/// <summary>Runs a model on this machine's cores.</summary>
public sealed class LocalRun
{
    /// <summary>A larger share of trials drawn again would bend the distribution.</summary>
    private const double LargestRedrawnShare = 0.001;

    private readonly PreparedRun _run;
    private readonly RunReduction _reduction;
    private readonly Action<RunProgress>? _progress;
    private readonly CancellationToken _cancellation;
    private readonly Lock _lock = new();
    private readonly long[] _redrawn;
    private long _nextLeaf;
    private long _trialsDone;
    private long _firstFaultyLeaf = long.MaxValue;
    private TileFault? _fault;

    private LocalRun(PreparedRun run, Action<RunProgress>? progress, CancellationToken cancellation)
    {
        _run = run;
        _reduction = new RunReduction(run.Settings.Trials, [.. run.Outcomes.Select(outcome => outcome.Request)], run.Pool);
        _progress = progress;
        _cancellation = cancellation;
        _redrawn = new long[run.Components.Count];
    }

    /// <summary>Runs to the end, to the first fault or until it is cancelled.</summary>
    /// <param name="model">A model that was read without error.</param>
    /// <param name="settings">Seed, trials, threads.</param>
    /// <param name="progress">Called after each leaf by the thread that computed it, one call at a time.</param>
    /// <param name="cancellation">Stops the run between leaves.</param>
    /// <exception cref="OperationCanceledException">The run was cancelled.</exception>
    public static RunOutcome Execute(
        Model model, RunSettings settings, Action<RunProgress>? progress, CancellationToken cancellation)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(settings.Trials, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(settings.Trials, Streams.Counter.MaxTrials);
        ArgumentOutOfRangeException.ThrowIfLessThan(settings.Threads, 1);
        return Execute(new PreparedRun(model, settings), progress, cancellation);
    }

    internal static RunOutcome Execute(PreparedRun run, Action<RunProgress>? progress, CancellationToken cancellation) =>
        new LocalRun(run, progress, cancellation).Execute();

    private RunOutcome Execute()
    {
        int threads = (int)Math.Min(_run.Settings.Threads, _run.Leaves);
        Task[] workers = [.. Enumerable.Range(0, threads).Select(_ => Task.Factory.StartNew(
            Work, CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default))];
        Task.WaitAll(workers, CancellationToken.None);
        _cancellation.ThrowIfCancellationRequested();
        if (_fault is { } fault)
        {
            return RunOutcome.Failed(TrialTrace.Explain(_run.Compiled, fault));
        }

        return FirstOverdrawn() is { } component
            ? RunOutcome.Refused(TooManyRedraws(component))
            : RunOutcome.Of(_run, _reduction.Finish(), _redrawn);
    }

    private string? FirstOverdrawn()
    {
        int index = Array.FindIndex(_redrawn, count => count > _run.Settings.Trials * LargestRedrawnShare);
        return index < 0 ? null : _run.Components[index].Name;
    }

    private static string TooManyRedraws(string component) =>
        $"more than 0.1 % of the pseudo-triangles of '{component}' gave no development factor, so those that did are no fair sample; "
        + "leave out the link ratios or the origins that make a column's sum negative, choose 'scale: by_development', or use 'method: mack'";

    private void Work()
    {
        using var runner = new LeafRunner(_run);
        while (!_cancellation.IsCancellationRequested)
        {
            long leaf = Interlocked.Increment(ref _nextLeaf) - 1;

            // Leaves are handed out in order, so every leaf below a faulty one is computed, and the lowest fault is found.
            if (leaf >= _run.Leaves || leaf > Interlocked.Read(ref _firstFaultyLeaf))
            {
                break;
            }

            if (runner.Compute(leaf) is { } fault)
            {
                Note(fault, leaf);
            }
            else
            {
                Accept(leaf, runner.Summarise(leaf));
            }
        }

        AddRedrawn(runner);
    }

    private void Note(TileFault fault, long leaf)
    {
        lock (_lock)
        {
            _fault = TileFault.First(_fault, fault);
            _firstFaultyLeaf = Math.Min(_firstFaultyLeaf, leaf);
        }
    }

    private void Accept(long leaf, OutcomeSummary[] summaries)
    {
        _reduction.Accept(0, leaf, summaries);
        lock (_lock)
        {
            _trialsDone += _run.TrialsOfLeaf(leaf);
            _progress?.Invoke(new RunProgress(_trialsDone, _run.Settings.Trials, outcome => _reduction.Preview(outcome, ErrorMethod.ClosedForm)));
        }
    }

    private void AddRedrawn(LeafRunner runner)
    {
        lock (_lock)
        {
            for (int i = 0; i < _redrawn.Length; i++)
            {
                _redrawn[i] += runner.Redrawn(i);
            }
        }
    }
}
