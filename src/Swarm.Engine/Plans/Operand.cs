using System.Runtime.CompilerServices;

namespace Swarm.Engine.Plans;

/// <summary>A column of a tile, or a constant repeated eight times.</summary>
internal readonly unsafe struct Operand(double* start, bool isConstant)
{
    public double* Start { get; } = start;

    public bool IsConstant { get; } = isConstant;

    /// <summary>Where the value of trial i (a multiple of the vector width) is loaded from.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public double* At(int i) => IsConstant ? Start : Start + i;
}
