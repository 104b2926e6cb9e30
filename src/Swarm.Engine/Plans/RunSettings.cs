using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>What a run is asked for. Of these, only seed and trials show in the result.</summary>
public sealed record RunSettings
{
    /// <summary>Seed of every stream.</summary>
    public ulong Seed { get; init; } = 1;

    /// <summary>Number of trials, from 1 to 2^48.</summary>
    public required long Trials { get; init; }

    /// <summary>Number of threads.</summary>
    public required int Threads { get; init; }

    /// <summary>Vector width, for tests: the widest of this machine unless set.</summary>
    internal LaneWidth Width { get; init; } = LaneWidths.OfThisMachine;
}
