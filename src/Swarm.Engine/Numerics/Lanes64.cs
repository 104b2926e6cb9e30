using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

/// <summary>One double: the path of a machine without vectors, and of set-up code that must agree with the kernels.</summary>
internal readonly unsafe struct Lanes64 : ILanes<Lanes64>
{
    private const ulong SignBit = 1UL << 63;
    private readonly double _v;

    private Lanes64(double v) => _v = v;

    public double Value => _v;

    public static int Count => 1;

    public static Lanes64 Iota => CreateBits(0);

    private ulong Bits => BitConverter.DoubleToUInt64Bits(_v);

    public static Lanes64 Create(double value) => new(value);

    public static Lanes64 CreateBits(ulong bits) => new(BitConverter.UInt64BitsToDouble(bits));

    public static Lanes64 Load(double* source) => new(*source);

    public static void Store(Lanes64 value, double* destination) => *destination = value._v;

    public static Lanes64 operator +(Lanes64 a, Lanes64 b) => new(a._v + b._v);

    public static Lanes64 operator -(Lanes64 a, Lanes64 b) => new(a._v - b._v);

    public static Lanes64 operator *(Lanes64 a, Lanes64 b) => new(a._v * b._v);

    public static Lanes64 operator /(Lanes64 a, Lanes64 b) => new(a._v / b._v);

    public static Lanes64 operator -(Lanes64 a) => CreateBits(a.Bits ^ SignBit);

    public static Lanes64 operator &(Lanes64 a, Lanes64 b) => CreateBits(a.Bits & b.Bits);

    public static Lanes64 operator |(Lanes64 a, Lanes64 b) => CreateBits(a.Bits | b.Bits);

    public static Lanes64 operator ^(Lanes64 a, Lanes64 b) => CreateBits(a.Bits ^ b.Bits);

    public static Lanes64 operator ~(Lanes64 a) => CreateBits(~a.Bits);

    public static Lanes64 FusedMultiplyAdd(Lanes64 a, Lanes64 b, Lanes64 c) => new(Math.FusedMultiplyAdd(a._v, b._v, c._v));

    public static Lanes64 Sqrt(Lanes64 a) => new(Math.Sqrt(a._v));

    public static Lanes64 Floor(Lanes64 a) => new(Math.Floor(a._v));

    public static Lanes64 Abs(Lanes64 a) => CreateBits(a.Bits & ~SignBit);

    public static Lanes64 LessThan(Lanes64 a, Lanes64 b) => Mask(a._v < b._v);

    public static Lanes64 LessThanOrEqual(Lanes64 a, Lanes64 b) => Mask(a._v <= b._v);

    public static Lanes64 EqualTo(Lanes64 a, Lanes64 b) => Mask(a._v == b._v);

    public static Lanes64 Select(Lanes64 mask, Lanes64 a, Lanes64 b) => CreateBits((mask.Bits & a.Bits) | (~mask.Bits & b.Bits));

    public static bool Any(Lanes64 mask) => (mask.Bits & SignBit) != 0;

    public static ulong SignBits(Lanes64 mask) => mask.Bits >> 63;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes64 Xor(Lanes64 a, Lanes64 b, Lanes64 c) => CreateBits(a.Bits ^ b.Bits ^ c.Bits);

    public static Lanes64 AddIntegers(Lanes64 a, Lanes64 b) => CreateBits(a.Bits + b.Bits);

    public static Lanes64 SubtractIntegers(Lanes64 a, Lanes64 b) => CreateBits(a.Bits - b.Bits);

    public static Lanes64 MultiplyLow32(Lanes64 a, Lanes64 b) => CreateBits((ulong)(uint)a.Bits * (uint)b.Bits);

    public static Lanes64 ShiftLeft(Lanes64 a, int bits) => CreateBits(a.Bits << bits);

    public static Lanes64 ShiftRight(Lanes64 a, int bits) => CreateBits(a.Bits >> bits);

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Lanes64 Mask(bool set) => CreateBits(set ? ulong.MaxValue : 0);
}
