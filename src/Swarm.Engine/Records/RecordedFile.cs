using System.Security.Cryptography;
using System.Text;

namespace Swarm.Engine.Records;

/// <summary>The model document of a run.</summary>
/// <param name="Name">Its file name as the user gave it, without the folder.</param>
/// <param name="Text">Its text.</param>
public sealed record RecordedModel(string Name, string Text)
{
    /// <summary>
    /// SHA-256 of the text in UTF-8, lower-case hexadecimal. Line ends count as a single line feed, so that a checkout under
    /// another operating system has the same hash.
    /// </summary>
    public string Sha256 => Hex.OfSha256(Encoding.UTF8.GetBytes(Text.Replace("\r\n", "\n", StringComparison.Ordinal)));
}

/// <summary>A data file that the model names.</summary>
/// <param name="Name">Its name as the model gives it.</param>
/// <param name="Content">Its bytes, unchanged.</param>
public sealed record RecordedData(string Name, ReadOnlyMemory<byte> Content)
{
    /// <summary>SHA-256 of the bytes, lower-case hexadecimal.</summary>
    public string Sha256 => Hex.OfSha256(Content.Span);
}

internal static class Hex
{
    public static string OfSha256(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
