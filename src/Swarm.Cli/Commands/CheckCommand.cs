using System.CommandLine;
using Swarm.Cli.Output;

namespace Swarm.Cli.Commands;

/// <summary><c>swarm check</c>: reads a model, tells every error at once, simulates nothing.</summary>
internal static class CheckCommand
{
    public static Command Create(Terminal terminal)
    {
        var model = ModelArgument.Create();
        const string Purpose = "Read a model, tell all its errors at once, and sum up what it holds. Nothing is simulated.";
        var command = new Command("check", Purpose) { model };
        command.SetAction(parsed =>
        {
            if (ModelArgument.Read(parsed.GetRequiredValue(model), terminal) is not { } input) return ExitCodes.InputRefused;
            ModelSummary.Write(terminal.Out, input.Reading.Model!);
            return ExitCodes.Done;
        });
        return command;
    }
}
