using System.CommandLine;
using System.CommandLine.Help;

namespace Swarm.Cli.Commands;

/// <summary>The command line: `swarm` and the commands below it.</summary>
internal static class SwarmCommand
{
    /// <summary>Runs one command line and gives its exit code.</summary>
    public static async Task<int> InvokeAsync(IReadOnlyList<string> arguments, Terminal terminal, CancellationToken cancellation)
    {
        var parsed = Create(terminal).Parse(arguments);
        if (parsed.Errors.Count > 0)
        {
            foreach (var error in parsed.Errors) terminal.Tell($"{error.Message}");
            terminal.Tell("--help tells how the command is used");
            return ExitCodes.Usage;
        }

        // Signals are ours: a run that is stopped must be able to say so.
        var configuration = new InvocationConfiguration
        {
            Output = terminal.Out,
            Error = terminal.Error,
            ProcessTerminationTimeout = null,
            EnableDefaultExceptionHandler = false,
        };
        return await parsed.InvokeAsync(configuration, cancellation);
    }

    private static RootCommand Create(Terminal terminal)
    {
        var root = new RootCommand("The distribution of an outcome by simulation, with a standard error beside every figure.")
        {
            CheckCommand.Create(terminal),
            RunCommand.Create(terminal),
            ShowCommand.Create(terminal),
        };
        foreach (var help in root.Options.Select(option => option.Action).OfType<HelpAction>())
            help.MaxWidth = Output.RunReportOptions.Width;
        return root;
    }
}
