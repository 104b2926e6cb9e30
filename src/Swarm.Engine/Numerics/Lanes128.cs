using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using System.Runtime.Intrinsics.X86;

namespace Swarm.Engine.Numerics;

/// <summary>2 doubles in a 128-bit vector.</summary>
internal readonly unsafe struct Lanes128 : ILanes<Lanes128>
{
    private readonly Vector128<double> _v;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private Lanes128(Vector128<double> v) => _v = v;

    public static int Count => 2;

    public static Lanes128 Iota
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        get => new(Vector128.Create(0UL, 1UL).AsDouble());
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Create(double value) => new(Vector128.Create(value));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 CreateBits(ulong bits) => new(Vector128.Create(bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Load(double* source) => new(Vector128.Load(source));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static void Store(Lanes128 value, double* destination) => value._v.Store(destination);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator +(Lanes128 a, Lanes128 b) => new(a._v + b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator -(Lanes128 a, Lanes128 b) => new(a._v - b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator *(Lanes128 a, Lanes128 b) => new(a._v * b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator /(Lanes128 a, Lanes128 b) => new(a._v / b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator -(Lanes128 a) => new(a._v ^ Vector128.Create(-0.0));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator &(Lanes128 a, Lanes128 b) => new(a._v & b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator |(Lanes128 a, Lanes128 b) => new(a._v | b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator ^(Lanes128 a, Lanes128 b) => new(a._v ^ b._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 operator ~(Lanes128 a) => new(~a._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 FusedMultiplyAdd(Lanes128 a, Lanes128 b, Lanes128 c)
        => new(Vector128.FusedMultiplyAdd(a._v, b._v, c._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Sqrt(Lanes128 a) => new(Vector128.Sqrt(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Floor(Lanes128 a) => new(Vector128.Floor(a._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Abs(Lanes128 a) => new(Vector128.AndNot(a._v, Vector128.Create(-0.0)));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 LessThan(Lanes128 a, Lanes128 b) => new(Vector128.LessThan(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 LessThanOrEqual(Lanes128 a, Lanes128 b) => new(Vector128.LessThanOrEqual(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 EqualTo(Lanes128 a, Lanes128 b) => new(Vector128.Equals(a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Select(Lanes128 mask, Lanes128 a, Lanes128 b) => new(Vector128.ConditionalSelect(mask._v, a._v, b._v));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static bool Any(Lanes128 mask) => Vector128.ExtractMostSignificantBits(mask._v) != 0;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static ulong SignBits(Lanes128 mask) => Vector128.ExtractMostSignificantBits(mask._v);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 Xor(Lanes128 a, Lanes128 b, Lanes128 c) => new((a._v.AsUInt64() ^ b._v.AsUInt64() ^ c._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 AddIntegers(Lanes128 a, Lanes128 b) => new((a._v.AsUInt64() + b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 SubtractIntegers(Lanes128 a, Lanes128 b) => new((a._v.AsUInt64() - b._v.AsUInt64()).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 MultiplyLow32(Lanes128 a, Lanes128 b)
        => new(Sse2.IsSupported ? Sse2.Multiply(a._v.AsUInt32(), b._v.AsUInt32()).AsDouble() : (Low32(a) * Low32(b)).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 ShiftLeft(Lanes128 a, int bits) => new(Vector128.ShiftLeft(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes128 ShiftRight(Lanes128 a, int bits) => new(Vector128.ShiftRightLogical(a._v.AsUInt64(), bits).AsDouble());

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector128<ulong> Low32(Lanes128 a) => a._v.AsUInt64() & Vector128.Create(0xFFFFFFFFUL);
}
