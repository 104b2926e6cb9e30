using System.Runtime.InteropServices;
using System.Security.Cryptography;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Numerics;

/// <summary>The functions' bits belong to the edition: whoever changes them changes the edition and this digest.</summary>
public class GoldenBitsTests
{
    private const string Golden = "7cc77efdf8e5a738b828f3c028cd2b121c26fa530f06948ad3b2bb7d2c36a44e";

    [Theory]
    [InlineData((int)LaneWidth.Scalar)]
    [InlineData((int)LaneWidth.Vector128)]
    [InlineData((int)LaneWidth.Vector256)]
    [InlineData((int)LaneWidth.Vector512)]
    public void Every_function_gives_the_bits_of_this_edition(int width)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        var (x, y) = Arguments();
        foreach (var function in LaneFunction.All)
            hash.AppendData(MemoryMarshal.AsBytes<double>(function.Run((LaneWidth)width, x, y)));

        Assert.Equal(Golden, Convert.ToHexStringLower(hash.GetHashAndReset()));
    }

    /// <summary>A third random bits, a third uniforms, a third everyday sizes, from Weyl's sequence by an odd step.</summary>
    private static (double[] X, double[] Y) Arguments()
    {
        var x = new double[8192];
        var y = new double[x.Length];
        var state = 1UL;
        double Next(int kind)
        {
            state += 0x9E37_79B9_7F4A_7C15;
            var mixed = (state ^ (state >> 29)) * 0xBF58_476D_1CE4_E5B9;
            var uniform = ((mixed >> 12) + 0.5) / (1UL << 52);
            return kind switch
            {
                0 => BitConverter.UInt64BitsToDouble(mixed),
                1 => uniform,
                _ => (uniform - 0.5) * 60,
            };
        }

        for (var i = 0; i < x.Length; i++)
        {
            x[i] = Next(i % 3);
            y[i] = Next(i / 3 % 3);
        }

        return (x, y);
    }
}
