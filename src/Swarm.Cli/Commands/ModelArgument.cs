using System.CommandLine;
using Swarm.Cli.Inputs;
using Swarm.Engine.Models;

namespace Swarm.Cli.Commands;

/// <summary>The model that a command works on, and how it is refused.</summary>
internal static class ModelArgument
{
    public static Argument<string> Create() => new("MODEL") { Description = "The model document, YAML; data files lie beside it." };

    /// <summary>Reads the model and tells what is to be said of it; null if it is refused.</summary>
    public static ModelInput? Read(string path, Terminal terminal)
    {
        try
        {
            var input = ModelInput.Read(path);
            foreach (var diagnostic in input.Reading.Diagnostics) terminal.Error.WriteLine(diagnostic);
            var isRefused = input.Reading.Diagnostics.Any(diagnostic => diagnostic.Severity == Severity.Error);
            return isRefused || input.Reading.Model is null ? null : input;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            terminal.Tell($"cannot read {path}: {fault.Message}");
            return null;
        }
    }
}
