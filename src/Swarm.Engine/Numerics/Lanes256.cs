using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;

namespace Swarm.Engine.Numerics;

/// <summary>4 doubles in a 256-bit vector.</summary>
internal readonly unsafe struct Lanes256 : ILanes<Lanes256>
{
    private readonly Vector256<double> _v;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Lanes256(Vector256<double> v) => _v = v;

    public static int Count => 4;

    public static Lanes256 Iota
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        get => new(Vector256.Create(0UL, 1UL, 2UL, 3UL).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Create(double value) => new(Vector256.Create(value));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 CreateBits(ulong bits) => new(Vector256.Create(bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Load(double* source) => new(Vector256.Load(source));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Store(Lanes256 value, double* destination) => value._v.Store(destination);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator +(Lanes256 a, Lanes256 b) => new(a._v + b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator -(Lanes256 a, Lanes256 b) => new(a._v - b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator *(Lanes256 a, Lanes256 b) => new(a._v * b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator /(Lanes256 a, Lanes256 b) => new(a._v / b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator -(Lanes256 a) => new(a._v ^ Vector256.Create(-0.0));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator &(Lanes256 a, Lanes256 b) => new(a._v & b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator |(Lanes256 a, Lanes256 b) => new(a._v | b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator ^(Lanes256 a, Lanes256 b) => new(a._v ^ b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 operator ~(Lanes256 a) => new(~a._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 FusedMultiplyAdd(Lanes256 a, Lanes256 b, Lanes256 c)
        => new(Vector256.FusedMultiplyAdd(a._v, b._v, c._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Sqrt(Lanes256 a) => new(Vector256.Sqrt(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Floor(Lanes256 a) => new(Vector256.Floor(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Abs(Lanes256 a) => new(Vector256.AndNot(a._v, Vector256.Create(-0.0)));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 LessThan(Lanes256 a, Lanes256 b) => new(Vector256.LessThan(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 LessThanOrEqual(Lanes256 a, Lanes256 b) => new(Vector256.LessThanOrEqual(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 EqualTo(Lanes256 a, Lanes256 b) => new(Vector256.Equals(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Select(Lanes256 mask, Lanes256 a, Lanes256 b) => new(Vector256.ConditionalSelect(mask._v, a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lanes256 mask) => Vector256.ExtractMostSignificantBits(mask._v) != 0;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ulong SignBits(Lanes256 mask) => Vector256.ExtractMostSignificantBits(mask._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 Xor(Lanes256 a, Lanes256 b, Lanes256 c) => new((a._v.AsUInt64() ^ b._v.AsUInt64() ^ c._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 AddIntegers(Lanes256 a, Lanes256 b) => new((a._v.AsUInt64() + b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 SubtractIntegers(Lanes256 a, Lanes256 b) => new((a._v.AsUInt64() - b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 MultiplyLow32(Lanes256 a, Lanes256 b)
        => new(Avx2.IsSupported ? Avx2.Multiply(a._v.AsUInt32(), b._v.AsUInt32()).AsDouble() : (Low32(a) * Low32(b)).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 ShiftLeft(Lanes256 a, int bits) => new(Vector256.ShiftLeft(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes256 ShiftRight(Lanes256 a, int bits) => new(Vector256.ShiftRightLogical(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<ulong> Low32(Lanes256 a) => a._v.AsUInt64() & Vector256.Create(0xFFFFFFFFUL);
}
