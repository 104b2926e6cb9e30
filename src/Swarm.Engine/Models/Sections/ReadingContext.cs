using Swarm.Engine.Distributions;
using Swarm.Engine.Models.Names;

namespace Swarm.Engine.Models.Sections;

/// <summary>What the sections of a document share while it is read.</summary>
internal sealed record ReadingContext
{
    /// <summary>Where the document begins: the place of what concerns it as a whole.</summary>
    public required SourcePosition Start { get; init; }

    public required DiagnosticList Diagnostics { get; init; }

    public required IReadOnlyList<DistributionForm> Forms { get; init; }

    public required DataFiles Data { get; init; }

    public required NameTable Names { get; init; }

    /// <summary>Last step; 0 where the document has none, null where what it says cannot be read.</summary>
    public int? Horizon { get; init; }
}
