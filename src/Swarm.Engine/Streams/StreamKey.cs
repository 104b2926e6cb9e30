using System.Buffers.Binary;
using System.Security.Cryptography;
using System.Text;

namespace Swarm.Engine.Streams;

/// <summary>
/// Key of a random stream: the first 64 bits of SHA-256 over the seed, the role and the name, so that neighbouring seeds and
/// similar names share nothing.
/// </summary>
/// <param name="Value">The 64 bits, Philox's two key words.</param>
public readonly record struct StreamKey(ulong Value)
{
    /// <summary>Key of what <paramref name="name"/> draws in one of its roles.</summary>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="role">What is drawn: a draw's value, the counts of a book, the residuals of a triangle.</param>
    /// <param name="name">Name of the draw or component.</param>
    public static StreamKey Of(ulong seed, string role, string name)
    {
        byte[] text = Encoding.UTF8.GetBytes($"swarm.stream.1\0{role}\0{name}");
        byte[] message = new byte[text.Length + sizeof(ulong)];
        BinaryPrimitives.WriteUInt64LittleEndian(message, seed);
        text.CopyTo(message, sizeof(ulong));
        return new StreamKey(BinaryPrimitives.ReadUInt64LittleEndian(SHA256.HashData(message)));
    }
}
