using System.Buffers.Binary;
using System.Security.Cryptography;

namespace Swarm.Protocol.Records;

/// <summary>
/// What stands before the protobuf payload on disk, 52 bytes: a mark of 8 bytes, the format version (32 bits, little-endian),
/// the payload's length (64 bits, little-endian), and SHA-256 over version, length and payload.
/// </summary>
internal static class RecordHeader
{
    /// <summary>The format that this program writes, and the latest that it reads.</summary>
    public const uint Format = 1;

    public const int Length = ChecksumOffset + SHA256.HashSizeInBytes;

    private const int FormatOffset = 8;
    private const int LengthOffset = FormatOffset + sizeof(uint);
    private const int ChecksumOffset = LengthOffset + sizeof(ulong);

    /// <summary>A byte above 127 and both line ends, so that a transfer as text is noticed at once.</summary>
    private static ReadOnlySpan<byte> Mark => [0x89, (byte)'S', (byte)'W', (byte)'R', (byte)'\r', (byte)'\n', 0x1A, (byte)'\n'];

    public static byte[] Wrap(ReadOnlySpan<byte> payload)
    {
        var file = new byte[Length + payload.Length];
        Mark.CopyTo(file);
        BinaryPrimitives.WriteUInt32LittleEndian(file.AsSpan(FormatOffset), Format);
        BinaryPrimitives.WriteUInt64LittleEndian(file.AsSpan(LengthOffset), (ulong)payload.Length);
        payload.CopyTo(file.AsSpan(Length));
        Checksum(file, file.AsSpan(ChecksumOffset, SHA256.HashSizeInBytes));
        return file;
    }

    /// <summary>Null if payload and header belong together.</summary>
    public static RecordFault? Verify(ReadOnlySpan<byte> file)
    {
        if (file.Length == 0) return new RecordFault(RecordFaultKind.Truncated, "the file is empty");
        var mark = file[..Math.Min(file.Length, Mark.Length)];
        if (!Mark.StartsWith(mark)) return new RecordFault(RecordFaultKind.Foreign, "the file is not a run record");
        if (file.Length < Length)
            return new RecordFault(RecordFaultKind.Truncated, $"the file ends within its header, after {file.Length} bytes");
        var format = BinaryPrimitives.ReadUInt32LittleEndian(file[FormatOffset..]);
        if (format > Format)
            return Newer(format);
        var promised = BinaryPrimitives.ReadUInt64LittleEndian(file[LengthOffset..]);
        var present = (ulong)(file.Length - Length);
        if (present < promised)
            return new RecordFault(RecordFaultKind.Truncated, $"the file ends after {present} of {promised} bytes of its contents");
        return present == promised && ChecksumMatches(file)
            ? null
            : new RecordFault(RecordFaultKind.Damaged, "the contents do not match their checksum");
    }

    private static RecordFault Newer(uint format) => new(
        RecordFaultKind.Newer, $"the record has format {format}, this program reads up to format {Format}; use a later swarm");

    private static bool ChecksumMatches(ReadOnlySpan<byte> file)
    {
        Span<byte> checksum = stackalloc byte[SHA256.HashSizeInBytes];
        Checksum(file, checksum);
        return checksum.SequenceEqual(file.Slice(ChecksumOffset, checksum.Length));
    }

    private static void Checksum(ReadOnlySpan<byte> file, Span<byte> checksum)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        hash.AppendData(file[FormatOffset..ChecksumOffset]);
        hash.AppendData(file[Length..]);
        hash.GetHashAndReset(checksum);
    }
}
