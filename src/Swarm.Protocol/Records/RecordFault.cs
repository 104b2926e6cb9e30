using Swarm.Engine.Records;

namespace Swarm.Protocol.Records;

/// <summary>What reading a run record gave: the record, or why it is refused.</summary>
/// <param name="Record">The record, or null.</param>
/// <param name="Fault">Why there is none, or null.</param>
public readonly record struct RecordReading(RunRecord? Record, RecordFault? Fault);

/// <summary>Why a run record is refused.</summary>
/// <param name="Kind">The cause.</param>
/// <param name="Message">The cause in a sentence without a full stop.</param>
public sealed record RecordFault(RecordFaultKind Kind, string Message);

/// <summary>Causes of refusal.</summary>
public enum RecordFaultKind
{
    /// <summary>The file cannot be read at all.</summary>
    Unreadable,

    /// <summary>Not a run record.</summary>
    Foreign,

    /// <summary>A run record of a later format.</summary>
    Newer,

    /// <summary>The file ends too early.</summary>
    Truncated,

    /// <summary>The checksum does not match.</summary>
    Damaged,

    /// <summary>The checksum matches, but the contents contradict each other.</summary>
    Inconsistent,
}
