using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>Something that a fit has to say about a triangle or its options.</summary>
/// <param name="Severity">An error means that the method cannot be used on this triangle.</param>
/// <param name="Message">What is wrong; names the cell.</param>
/// <param name="Hint">A way out.</param>
public sealed record Finding(Severity Severity, string Message, string Hint)
{
    /// <summary>The finding as a diagnostic at the place where the model names the triangle.</summary>
    public Diagnostic At(SourcePosition position) => new(Severity, position, Message, Hint);

    internal static Finding Error(string message, string hint) => new(Severity.Error, message, hint);

    internal static Finding Warning(string message, string hint) => new(Severity.Warning, message, hint);
}
