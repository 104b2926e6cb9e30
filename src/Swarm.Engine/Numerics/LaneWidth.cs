using System.Runtime.Intrinsics;

namespace Swarm.Engine.Numerics;

/// <summary>The vector width that kernels run at. Widths differ in speed alone, never in bits.</summary>
internal enum LaneWidth
{
    Scalar = 64,
    Vector128 = 128,
    Vector256 = 256,
    Vector512 = 512,
}

internal static class LaneWidths
{
    /// <summary>The widest that this machine accelerates.</summary>
    public static LaneWidth OfThisMachine { get; } =
        Vector512.IsHardwareAccelerated ? LaneWidth.Vector512
        : Vector256.IsHardwareAccelerated ? LaneWidth.Vector256
        : Vector128.IsHardwareAccelerated ? LaneWidth.Vector128
        : LaneWidth.Scalar;
}
