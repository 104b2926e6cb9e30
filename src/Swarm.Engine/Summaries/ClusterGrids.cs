using System.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>Grids of the sizes that come up again and again: those of whole nodes, and the last other one.</summary>
internal sealed class ClusterGrids
{
    private readonly ClusterGrid?[] _whole = new ClusterGrid?[48];
    private ClusterGrid? _other;

    public ClusterGrid For(long count)
    {
        var leaves = (ulong)count / Edition.TrialsPerLeaf;
        if (leaves * Edition.TrialsPerLeaf == (ulong)count && BitOperations.IsPow2(leaves))
            return _whole[BitOperations.Log2(leaves)] ??= new ClusterGrid(count);
        return _other?.Count == count ? _other : _other = new ClusterGrid(count);
    }
}
