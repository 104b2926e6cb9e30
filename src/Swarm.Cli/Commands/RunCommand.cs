using System.CommandLine;
using Swarm.Cli.Inputs;
using Swarm.Cli.Running;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Protocol.Records;

namespace Swarm.Cli.Commands;

/// <summary><c>swarm run</c>: simulates a model on this machine.</summary>
internal sealed class RunCommand
{
    private const long MostTrials = 1L << 48;
    private const long DefaultTrials = 1_000_000;
    private const int MostThreads = 1024;

    private readonly Terminal _terminal;
    private readonly ReportOptions _report = new();
    private readonly Argument<string> _model = ModelArgument.Create();

    private readonly Option<long> _trials = new("--trials")
    {
        Description = "Number of trials.",
        DefaultValueFactory = _ => DefaultTrials,
        CustomParser = result => NumberArguments.Whole(result, 1, MostTrials),
        HelpName = "N",
    };

    private readonly Option<ulong> _seed = new("--seed")
    {
        Description = "Seed of the random numbers. The same seed gives the same bits.",
        DefaultValueFactory = _ => 1,
        CustomParser = NumberArguments.Seed,
        HelpName = "N",
    };

    private readonly Option<int> _threads = new("--threads")
    {
        Description = "Number of threads; all cores unless given. It changes no result.",
        CustomParser = result => (int)NumberArguments.Whole(result, 1, MostThreads),
        HelpName = "N",
    };

    private readonly Option<string?> _out = new("--out")
    {
        Description = "Where the run record goes; runs/MODEL-DIGEST.swarm unless given.",
        HelpName = "FILE",
    };

    private readonly Option<bool> _noRecord = new("--no-record") { Description = "Write no run record." };

    private RunCommand(Terminal terminal) => _terminal = terminal;

    public static Command Create(Terminal terminal) => new RunCommand(terminal).Create();

    private Command Create()
    {
        var command = new Command("run", "Simulate a model on this machine, show its figures, and keep a run record.")
        {
            _model,
            _trials,
            _seed,
            _threads,
            _out,
            _noRecord,
        };
        _report.AddTo(command);
        command.Validators.Add(result =>
        {
            if (result.GetResult(_out) is not null && result.GetValue(_noRecord))
                result.AddError("--out and --no-record exclude each other");
        });
        command.SetAction(RunAsync);
        return command;
    }

    private async Task<int> RunAsync(ParseResult parsed, CancellationToken cancellation)
    {
        if (ModelArgument.Read(parsed.GetRequiredValue(_model), _terminal) is not { } input) return ExitCodes.InputRefused;
        var threads = parsed.GetValue(_threads);
        var settings = new RunSettings
        {
            Seed = parsed.GetValue(_seed),
            Trials = parsed.GetValue(_trials),
            Threads = threads == 0 ? Environment.ProcessorCount : threads,
        };
        try
        {
            var outcome = await new WatchedRun(_terminal).ExecuteAsync(input.Reading.Model!, settings, cancellation);
            var reason = outcome.Fault is { } fault ? $"the run stopped at {fault}" : outcome.Refusal;
            if (reason is null) return Report(parsed, input, settings, outcome, cancellation);
            _terminal.Tell(reason);
            return ExitCodes.Fault;
        }
        catch (OperationCanceledException)
        {
            _terminal.Tell("stopped before the end; nothing was written");
            return ExitCodes.Interrupted;
        }
    }

    private int Report(ParseResult parsed, ModelInput input, RunSettings settings, RunOutcome outcome, CancellationToken cancellation)
    {
        var record = RecordOfRun.Build(input, settings, outcome);
        var saved = parsed.GetValue(_noRecord) ? ExitCodes.Done : Save(record, parsed.GetValue(_out));
        var shown = _report.Show(parsed, _terminal, record, cancellation);
        return saved == ExitCodes.Done ? shown : saved;
    }

    private int Save(RunRecord record, string? path)
    {
        path ??= Path.Combine("runs", $"{Path.GetFileNameWithoutExtension(record.Model.Name)}-{record.Digest[..8]}.swarm");
        return FileFaults.Guard(_terminal, path, () =>
        {
            RecordWriter.Save(record, path);
            _terminal.Tell($"run record {path}");
        });
    }
}
