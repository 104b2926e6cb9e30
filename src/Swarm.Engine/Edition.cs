namespace Swarm.Engine;

/// <summary>The constants that fix the bits of a result. Changing any of them is a new edition.</summary>
public static class Edition
{
    /// <summary>Number of this edition: equal editions give equal bits from equal inputs.</summary>
    public const int Number = 1;

    /// <summary>Consecutive trials of a block, the unit that the engine computes and that stratified and re-ordered draws span.</summary>
    public const int TrialsPerBlock = 4096;

    /// <summary>Blocks of a leaf, the smallest unit that is sketched and the smallest chunk. A power of two.</summary>
    public const int BlocksPerLeaf = 4;

    /// <summary>Trials of a full leaf.</summary>
    public const int TrialsPerLeaf = TrialsPerBlock * BlocksPerLeaf;

    /// <summary>Lanes of every reduction over trials, whatever the width of the machine's vectors.</summary>
    public const int VirtualLanes = 8;
}
