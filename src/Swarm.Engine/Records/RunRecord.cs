using Swarm.Engine.Models;
using Swarm.Engine.Plans;

namespace Swarm.Engine.Records;

/// <summary>
/// Everything that is needed to read, compare and re-perform a run. It holds no trace of host, clock, threads or chunks: equal
/// runs have equal records.
/// </summary>
public sealed record RunRecord
{
    /// <summary>Edition of the engine's arithmetic: an engine of this edition gives the same bits again.</summary>
    public required int Edition { get; init; }

    /// <summary>Version of the program that ran.</summary>
    public required string ToolVersion { get; init; }

    /// <summary>Seed of every stream.</summary>
    public required ulong Seed { get; init; }

    /// <summary>Number of trials.</summary>
    public required long Trials { get; init; }

    /// <summary>The model's own title.</summary>
    public required string Title { get; init; }

    /// <summary>Unit of money, or null.</summary>
    public Money? Money { get; init; }

    /// <summary>The model document.</summary>
    public required RecordedModel Model { get; init; }

    /// <summary>The data files that the model names.</summary>
    public IReadOnlyList<RecordedData> Data { get; init; } = [];

    /// <summary>The outcomes in the order in which they are shown.</summary>
    public required IReadOnlyList<ReportedResult> Outcomes { get; init; }

    /// <summary>Choices of method, and what happened while running.</summary>
    public IReadOnlyList<Note> Notes { get; init; } = [];

    /// <summary>Tables that components report.</summary>
    public IReadOnlyList<ReportTable> Tables { get; init; } = [];

    /// <summary>Digest of the result, computed anew at every call: see <see cref="ResultDigest"/>.</summary>
    public string Digest => ResultDigest.Of(Edition, Seed, Trials, [.. Outcomes.Select(outcome => outcome.Result)]);
}
