using System.CommandLine;
using Swarm.Protocol.Records;

namespace Swarm.Cli.Commands;

/// <summary><c>swarm show</c>: the figures of a run record.</summary>
internal static class ShowCommand
{
    public static Command Create(Terminal terminal)
    {
        var path = new Argument<string>("RECORD") { Description = "A run record, written by `swarm run`." };
        var report = new ReportOptions();
        var command = new Command("show", "Show the figures of a run record with their errors.") { path };
        report.AddTo(command);
        command.SetAction((parsed, cancellation) => Task.FromResult(Show(parsed.GetRequiredValue(path), parsed, cancellation)));
        return command;

        int Show(string file, ParseResult parsed, CancellationToken cancellation)
        {
            var reading = RecordReader.Load(file);
            if (reading.Record is { } record) return report.Show(parsed, terminal, record, cancellation);
            terminal.Tell($"{file} is refused: {reading.Fault!.Message}");
            return ExitCodes.RecordRefused;
        }
    }
}
