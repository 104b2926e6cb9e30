using Swarm.Engine.Models;
using Swarm.Engine.Plans;

namespace Swarm.Cli;

/// <summary>What the command touches of the world, passed in so that tests can stand in for it.</summary>
internal sealed record Terminal
{
    /// <summary>Results go here and nothing else, so that they can be piped.</summary>
    public required TextWriter Out { get; init; }

    /// <summary>Progress, diagnostics and file names go here.</summary>
    public required TextWriter Error { get; init; }

    /// <summary>True if <see cref="Error"/> is a terminal on which lines can be redrawn.</summary>
    public bool IsInteractive { get; init; }

    /// <summary>Clock of progress and rates.</summary>
    public TimeProvider Clock { get; init; } = TimeProvider.System;

    /// <summary>Runs a model.</summary>
    public ModelRun Run { get; init; } = LocalRun.Execute;

    /// <summary>Tells the user something that is not a result.</summary>
    public void Tell(string message) => Error.WriteLine($"swarm: {message}");
}

/// <summary>Runs a model to its end, to the first fault, or until it is cancelled.</summary>
internal delegate RunOutcome ModelRun(Model model, RunSettings settings, Action<RunProgress>? progress, CancellationToken cancellation);
