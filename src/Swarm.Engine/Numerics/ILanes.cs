namespace Swarm.Engine.Numerics;

/// <summary>
/// A vector of doubles (and of the 64-bit integers with the same bits) of one width. Kernels are written once over
/// <typeparamref name="TSelf"/> and give the same bits at every width, since each member is an IEEE 754 operation or an
/// integer operation, lane by lane.
/// </summary>
/// <typeparam name="TSelf">The implementing width.</typeparam>
internal unsafe interface ILanes<TSelf>
    where TSelf : unmanaged, ILanes<TSelf>
{
    /// <summary>Doubles in a vector: 8, 4, 2 or 1.</summary>
    static abstract int Count { get; }

    static abstract TSelf Create(double value);

    static abstract TSelf CreateBits(ulong bits);

    /// <summary>0, 1, 2, ... as 64-bit integers.</summary>
    static abstract TSelf Iota { get; }

    static abstract TSelf Load(double* source);

    static abstract void Store(TSelf value, double* destination);

    static abstract TSelf operator +(TSelf a, TSelf b);

    static abstract TSelf operator -(TSelf a, TSelf b);

    static abstract TSelf operator *(TSelf a, TSelf b);

    static abstract TSelf operator /(TSelf a, TSelf b);

    /// <summary>Flips the sign bit (also of zero and NaN).</summary>
    static abstract TSelf operator -(TSelf a);

    static abstract TSelf operator &(TSelf a, TSelf b);

    static abstract TSelf operator |(TSelf a, TSelf b);

    static abstract TSelf operator ^(TSelf a, TSelf b);

    static abstract TSelf operator ~(TSelf a);

    /// <summary>a * b + c with one rounding.</summary>
    static abstract TSelf FusedMultiplyAdd(TSelf a, TSelf b, TSelf c);

    static abstract TSelf Sqrt(TSelf a);

    static abstract TSelf Floor(TSelf a);

    /// <summary>Clears the sign bit.</summary>
    static abstract TSelf Abs(TSelf a);

    /// <summary>All bits set where a &lt; b; false where either is NaN.</summary>
    static abstract TSelf LessThan(TSelf a, TSelf b);

    static abstract TSelf LessThanOrEqual(TSelf a, TSelf b);

    static abstract TSelf EqualTo(TSelf a, TSelf b);

    /// <summary>Bitwise: a where the mask is set, else b.</summary>
    static abstract TSelf Select(TSelf mask, TSelf a, TSelf b);

    /// <summary>True if any lane of a comparison mask is set.</summary>
    static abstract bool Any(TSelf mask);

    /// <summary>One bit a lane from the sign bits, lane 0 lowest.</summary>
    static abstract ulong SignBits(TSelf mask);

    /// <summary>Exclusive or of three, as integers.</summary>
    static abstract TSelf Xor(TSelf a, TSelf b, TSelf c);

    /// <summary>Adds 64-bit integers, wrapping.</summary>
    static abstract TSelf AddIntegers(TSelf a, TSelf b);

    static abstract TSelf SubtractIntegers(TSelf a, TSelf b);

    /// <summary>Product of the low 32 bits of each 64-bit lane, unsigned; the high halves are ignored.</summary>
    static abstract TSelf MultiplyLow32(TSelf a, TSelf b);

    static abstract TSelf ShiftLeft(TSelf a, int bits);

    /// <summary>Logical shift of 64-bit integers.</summary>
    static abstract TSelf ShiftRight(TSelf a, int bits);
}
