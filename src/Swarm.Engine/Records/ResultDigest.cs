using System.Text;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Records;

/// <summary>
/// The fingerprint of a result: SHA-256 over its <see cref="CanonicalBytes"/>. Equal model, data, seed, trials and edition give
/// equal digests on every machine; the order in which a model lists its outcomes does not count.
/// </summary>
public static class ResultDigest
{
    private const string Heading = "swarm.result.1";

    /// <summary>The digest as 64 lower-case hexadecimal digits.</summary>
    /// <param name="edition">Edition of the engine that ran.</param>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="trials">Trials of the run.</param>
    /// <param name="results">The outcomes in any order; they are encoded in the order of their names' UTF-8 bytes.</param>
    public static string Of(int edition, ulong seed, long trials, IReadOnlyList<OutcomeResult> results)
    {
        var bytes = new CanonicalBytes();
        bytes.Write(Heading);
        bytes.Write(edition);
        bytes.Write(seed);
        bytes.Write(trials);
        bytes.Write(results.Count);
        foreach (var result in results.OrderBy(result => Encoding.UTF8.GetBytes(result.Request.Name), ByteOrder)) bytes.Write(result);
        return Hex.OfSha256(bytes.Written);
    }

    private static readonly Comparer<byte[]> ByteOrder = Comparer<byte[]>.Create((left, right) => left.AsSpan().SequenceCompareTo(right));
}
