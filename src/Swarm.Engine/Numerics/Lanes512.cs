using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;

namespace Swarm.Engine.Numerics;

/// <summary>8 doubles in a 512-bit vector.</summary>
internal readonly unsafe struct Lanes512 : ILanes<Lanes512>
{
    private readonly Vector512<double> _v;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Lanes512(Vector512<double> v) => _v = v;

    public static int Count => 8;

    public static Lanes512 Iota
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        get => new(Vector512.Create(0UL, 1UL, 2UL, 3UL, 4UL, 5UL, 6UL, 7UL).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Create(double value) => new(Vector512.Create(value));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 CreateBits(ulong bits) => new(Vector512.Create(bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Load(double* source) => new(Vector512.Load(source));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Store(Lanes512 value, double* destination) => value._v.Store(destination);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator +(Lanes512 a, Lanes512 b) => new(a._v + b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator -(Lanes512 a, Lanes512 b) => new(a._v - b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator *(Lanes512 a, Lanes512 b) => new(a._v * b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator /(Lanes512 a, Lanes512 b) => new(a._v / b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator -(Lanes512 a) => new(a._v ^ Vector512.Create(-0.0));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator &(Lanes512 a, Lanes512 b) => new(a._v & b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator |(Lanes512 a, Lanes512 b) => new(a._v | b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator ^(Lanes512 a, Lanes512 b) => new(a._v ^ b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 operator ~(Lanes512 a) => new(~a._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 FusedMultiplyAdd(Lanes512 a, Lanes512 b, Lanes512 c)
        => new(Vector512.FusedMultiplyAdd(a._v, b._v, c._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Sqrt(Lanes512 a) => new(Vector512.Sqrt(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Floor(Lanes512 a) => new(Vector512.Floor(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Abs(Lanes512 a) => new(Vector512.AndNot(a._v, Vector512.Create(-0.0)));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 LessThan(Lanes512 a, Lanes512 b) => new(Vector512.LessThan(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 LessThanOrEqual(Lanes512 a, Lanes512 b) => new(Vector512.LessThanOrEqual(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 EqualTo(Lanes512 a, Lanes512 b) => new(Vector512.Equals(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Select(Lanes512 mask, Lanes512 a, Lanes512 b) => new(Vector512.ConditionalSelect(mask._v, a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lanes512 mask) => Vector512.ExtractMostSignificantBits(mask._v) != 0;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ulong SignBits(Lanes512 mask) => Vector512.ExtractMostSignificantBits(mask._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 Xor(Lanes512 a, Lanes512 b, Lanes512 c) => new(Avx512F.IsSupported ? Avx512F.TernaryLogic(a._v.AsUInt64(), b._v.AsUInt64(), c._v.AsUInt64(), 0x96).AsDouble() :
        (a._v.AsUInt64() ^ b._v.AsUInt64() ^ c._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 AddIntegers(Lanes512 a, Lanes512 b) => new((a._v.AsUInt64() + b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 SubtractIntegers(Lanes512 a, Lanes512 b) => new((a._v.AsUInt64() - b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 MultiplyLow32(Lanes512 a, Lanes512 b)
        => new(Avx512F.IsSupported
            ? Avx512F.Multiply(a._v.AsUInt32(), b._v.AsUInt32()).AsDouble()
            : (Low32(a) * Low32(b)).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 ShiftLeft(Lanes512 a, int bits) => new(Vector512.ShiftLeft(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes512 ShiftRight(Lanes512 a, int bits) => new(Vector512.ShiftRightLogical(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector512<ulong> Low32(Lanes512 a) => a._v.AsUInt64() & Vector512.Create(0xFFFFFFFFUL);
}
