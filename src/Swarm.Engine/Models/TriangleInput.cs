using Swarm.Engine.Reserving;

namespace Swarm.Engine.Models;

/// <summary>A triangle named in a model, its data read, and the options of its method.</summary>
public sealed record TriangleInput
{
    /// <summary>Name in the model; its quantities are <c>name.unpaid</c>, <c>name.unpaid.ORIGIN</c>, <c>name.paid.YEAR</c>.</summary>
    public required string Name { get; init; }

    /// <summary>Key of its random numbers: its own name, unless <c>stream:</c> says otherwise.</summary>
    public required string Stream { get; init; }

    /// <summary>The data.</summary>
    public required Triangle Triangle { get; init; }

    /// <summary>Method and options.</summary>
    public required ReservingOptions Options { get; init; }

    /// <summary>Where it stands.</summary>
    public SourcePosition Position { get; init; }
}
