using System.Buffers;
using System.Buffers.Binary;
using System.Text;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Records;

/// <summary>
/// The one encoding of a result that digests are taken of. Little-endian; 32-bit counts before lists and before the UTF-8 bytes
/// of texts; doubles by their bits, every not-a-number as 7FF8000000000000 because its sign and payload differ between
/// processors. Only results go in: nothing of chunks, host, time, or the text of the inputs.
/// </summary>
public sealed class CanonicalBytes
{
    private const ulong QuietNaN = 0x7FF8_0000_0000_0000;
    private readonly ArrayBufferWriter<byte> _bytes = new(1 << 16);

    /// <summary>What was written.</summary>
    public ReadOnlySpan<byte> Written => _bytes.WrittenSpan;

    /// <summary>Writes a result: its request, summary and batches.</summary>
    public void Write(OutcomeResult result)
    {
        Write(result.Request);
        Write(result.Summary);
        Write(result.TrialsPerBatch);
        Write(result.Batches.Count);
        foreach (var batch in result.Batches) Write(batch);
    }

    /// <summary>Writes name, adverse end (0 high, 1 low), levels and thresholds.</summary>
    public void Write(OutcomeRequest request)
    {
        Write(request.Name);
        Write(request.Adverse == Adverse.Low ? 1 : 0);
        Write(request.Levels);
        Write(request.Thresholds);
    }

    /// <summary>Writes moments, exceedance counts and, cluster by cluster, mean, weight and 1 for an atom or 0.</summary>
    public void Write(OutcomeSummary summary)
    {
        Write(summary.Moments);
        Write(summary.Exceedances.Length);
        foreach (var count in summary.Exceedances) Write(count);
        var digest = summary.Digest;
        Write(digest.Count);
        for (var i = 0; i < digest.Count; i++)
        {
            Write(digest.Means[i]);
            Write(digest.WeightAt(i));
            Write(digest.IsAtomAt(i) ? 1 : 0);
        }
    }

    /// <summary>Writes moments, exceedance counts, VaR and TVaR of a batch.</summary>
    public void Write(BatchFigures batch)
    {
        Write(batch.Moments);
        Write(batch.Exceedances.Count);
        foreach (var count in batch.Exceedances) Write(count);
        Write(batch.Var);
        Write(batch.Tvar);
    }

    /// <summary>Writes count, mean, the power sums of order 2 to 6, least and greatest.</summary>
    public void Write(in Moments moments)
    {
        Write(moments.Count);
        Write(moments.Mean);
        for (var order = 2; order <= Moments.HighestOrder; order++) Write(moments.PowerSum(order));
        Write(moments.Min);
        Write(moments.Max);
    }

    /// <summary>Writes a text.</summary>
    public void Write(string text)
    {
        Write(Encoding.UTF8.GetByteCount(text));
        Encoding.UTF8.GetBytes(text, _bytes);
    }

    /// <summary>Writes 32 bits.</summary>
    public void Write(int value)
    {
        BinaryPrimitives.WriteInt32LittleEndian(_bytes.GetSpan(sizeof(int)), value);
        _bytes.Advance(sizeof(int));
    }

    /// <summary>Writes 64 bits.</summary>
    public void Write(long value) => Write((ulong)value);

    /// <summary>Writes 64 bits.</summary>
    public void Write(ulong value)
    {
        BinaryPrimitives.WriteUInt64LittleEndian(_bytes.GetSpan(sizeof(ulong)), value);
        _bytes.Advance(sizeof(ulong));
    }

    /// <summary>Writes the 64 bits of a number.</summary>
    public void Write(double value) => Write(double.IsNaN(value) ? QuietNaN : BitConverter.DoubleToUInt64Bits(value));

    private void Write(IReadOnlyList<double> values)
    {
        Write(values.Count);
        foreach (var value in values) Write(value);
    }
}
