using System.CommandLine;
using Swarm.Cli.Output;
using Swarm.Cli.Plots;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Commands;

/// <summary>The options that `run` and `show` share: how figures are shown.</summary>
internal sealed class ReportOptions
{
    private readonly Option<bool> _json = new("--json") { Description = "Print one JSON document at full precision, and nothing else." };
    private readonly Option<bool> _full = new("--full") { Description = "Show all figures of every origin, calendar period and step." };

    private readonly Option<DirectoryInfo?> _plot = new("--plot")
    {
        Description = "Draw pictures as SVG and PNG into this folder.",
        HelpName = "DIR",
    };

    private readonly Option<string> _errors = new("--errors")
    {
        Description = "Where standard errors come from: closed forms, or the spread between batches of trials.",
        DefaultValueFactory = _ => ClosedForm,
        HelpName = $"{ClosedForm}|{Batches}",
    };

    private const string ClosedForm = "closed-form";
    private const string Batches = "batches";

    public ReportOptions() => _errors.AcceptOnlyFromAmong(ClosedForm, Batches);

    public void AddTo(Command command)
    {
        command.Options.Add(_plot);
        command.Options.Add(_json);
        command.Options.Add(_full);
        command.Options.Add(_errors);
    }

    /// <summary>Shows a record as asked: text or JSON to the output, pictures to their folder.</summary>
    public int Show(ParseResult parsed, Terminal terminal, RunRecord record, CancellationToken cancellation)
    {
        var errors = parsed.GetValue(_errors) == Batches ? ErrorMethod.Batches : ErrorMethod.ClosedForm;
        if (parsed.GetValue(_json))
            terminal.Out.WriteLine(ResultJson.Of(record, errors));
        else
            new RunReport(record, new RunReportOptions(errors, parsed.GetValue(_full))).Write(terminal.Out);
        terminal.Out.Flush();
        if (parsed.GetValue(_plot) is not { } folder) return ExitCodes.Done;
        if (!Typeface.IsPresent)
            terminal.Tell("this machine has no fonts, so the pictures have no text; install one, such as fonts-dejavu-core");
        return FileFaults.Guard(terminal, folder.ToString(), () =>
        {
            foreach (var file in PlotFiles.Write(record, errors, folder.ToString(), cancellation))
                terminal.Tell($"picture {file}");
        });
    }
}
