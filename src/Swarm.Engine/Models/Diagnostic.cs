namespace Swarm.Engine.Models;

/// <summary>Something to say about an input: where, what is wrong, and what would be right.</summary>
/// <param name="Severity">An error refuses the input; a warning does not.</param>
/// <param name="Position">The place.</param>
/// <param name="Message">What is wrong, as a sentence without a full stop.</param>
/// <param name="Hint">What would be right, or null.</param>
public sealed record Diagnostic(Severity Severity, SourcePosition Position, string Message, string? Hint)
{
    /// <summary>One line: position, severity, message, hint.</summary>
    public override string ToString() =>
        $"{Position}: {(Severity == Severity.Error ? "error" : "warning")}: {Message}{(Hint is null ? "" : $"; {Hint}")}";
}

/// <summary>How grave a diagnostic is.</summary>
public enum Severity
{
    /// <summary>Worth a look; the input is accepted.</summary>
    Warning,

    /// <summary>The input is refused.</summary>
    Error,
}
