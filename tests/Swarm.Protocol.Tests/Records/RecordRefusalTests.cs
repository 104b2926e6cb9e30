using System.Buffers.Binary;
using CsCheck;
using Google.Protobuf;
using Swarm.Protocol.Mapping;
using Swarm.Protocol.Records;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Tests.Records;

public class RecordRefusalTests
{
    private static readonly byte[] Whole = RecordWriter.ToBytes(SampleRecord.Build());

    [Fact]
    public void An_empty_file_is_refused_as_truncated() => Refused(RecordFaultKind.Truncated, []);

    [Fact]
    public void Another_program_s_file_is_refused_as_foreign() => Refused(RecordFaultKind.Foreign, "model: no record"u8.ToArray());

    [Fact]
    public void A_file_that_went_through_a_text_transfer_is_refused_as_foreign() =>
        Refused(RecordFaultKind.Foreign, [.. Whole.Where((value, index) => index != 4 || value != '\r')]);

    [Fact]
    public void A_newer_format_is_refused_by_its_number()
    {
        var newer = Whole.ToArray();
        BinaryPrimitives.WriteUInt32LittleEndian(newer.AsSpan(8), 2);

        var fault = Refused(RecordFaultKind.Newer, newer);

        Assert.Equal("the record has format 2, this program reads up to format 1; use a later swarm", fault.Message);
    }

    [Fact]
    public void A_missing_file_is_refused_as_unreadable()
    {
        var path = Path.Combine(Path.GetTempPath(), Path.GetRandomFileName());

        Assert.Equal(RecordFaultKind.Unreadable, RecordReader.Load(path).Fault?.Kind);
    }

    [Fact]
    public void Every_truncation_is_refused() =>
        Gen.Int[0, Whole.Length - 1].Sample(length =>
            RecordReader.Read(Whole.AsSpan(0, length)) is { Record: null, Fault.Kind: RecordFaultKind.Truncated }, seed: "0000KqV0Zz3f");

    [Fact]
    public void Every_flipped_bit_is_refused() =>
        Gen.Select(Gen.Int[0, Whole.Length - 1], Gen.Int[0, 7]).Sample(
            (index, bit) =>
            {
                var flipped = Whole.ToArray();
                flipped[index] ^= (byte)(1 << bit);
                return RecordReader.Read(flipped) is { Record: null, Fault: not null };
            },
            seed: "0000KqV0Zz3f");

    [Fact]
    public void Bytes_after_the_end_are_refused() => Refused(RecordFaultKind.Damaged, [.. Whole, 0]);

    [Fact]
    public void Arbitrary_contents_behind_a_right_checksum_are_refused() =>
        Gen.Byte.Array[0, 400].Sample(
            payload => RecordReader.Read(RecordHeader.Wrap(payload)) is { Record: null, Fault.Kind: RecordFaultKind.Inconsistent },
            seed: "0000KqV0Zz3f");

    [Fact]
    public void A_flipped_bit_behind_a_right_checksum_never_gives_other_figures() =>
        Gen.Select(Gen.Int[RecordHeader.Length, Whole.Length - 1], Gen.Int[0, 7]).Sample(
            (index, bit) =>
            {
                var payload = Whole.AsSpan(RecordHeader.Length).ToArray();
                payload[index - RecordHeader.Length] ^= (byte)(1 << bit);
                var read = RecordReader.Read(RecordHeader.Wrap(payload));
                return read.Record is null || read.Record.Digest == SampleRecord.Build().Digest;
            },
            seed: "0000KqV0Zz3f");

    public static TheoryData<string, Action<Proto.RunRecord>> Contradictions => new()
    {
        { "the record is of no trials", record => record.Trials = 0 },
        { "header and contents name different formats", record => record.Format = 0 },
        { "the edition is out of range", record => record.Edition = 0 },
        { "the model is missing", record => record.Model = null },
        { "the model does not match its hash", record => record.Model.Text += " " },
        { "the data file motor-paid.csv does not match its hash", record => record.Data[0].Content = ByteString.Empty },
        { "the figures do not match the result digest", record => record.Seed++ },
        { "motor.unpaid has 8 trials, the run 9", record => record.Trials = 9 },
        { "motor.unpaid does not say which end hurts", record => record.Outcomes[0].Request.Adverse = Proto.Adverse.Unspecified },
        { "motor.unpaid has a level outside 0 to 1", record => record.Outcomes[0].Request.Levels[0] = 1 },
        { "a threshold of motor.unpaid is not finite", record => record.Outcomes[0].Request.Thresholds[0] = double.NaN },
        { "a digest has more clusters than trials", record => Swell(record.Outcomes[0].Summary.Digest) },
        { "Cluster 3 of the digest: the weights exceed the total.", record => record.Outcomes[0].Summary.Digest.Weights[0] = 4 },
        { "Cluster 1 of the digest: the means do not ascend.", record => record.Outcomes[0].Summary.Digest.Means[1] = -2 },
        { "Cluster 2 of the digest: the mean is not finite.", record => record.Outcomes[0].Summary.Digest.Means[2] = double.NaN },
        { "2 exceedance counts for 3 thresholds", record => record.Outcomes[0].Request.Thresholds.Add(3) },
        { "motor.unpaid has a batch that is not whole", record => record.Outcomes[0].Batches[1].Moments.Count = 3 },
        { "the columns of the table Residuals by cell differ in length", record => record.Tables[0].Columns[1].Numbers.Add(3) },
        { "the column origin has no known kind", record => record.Tables[0].Columns[0].Kind = (Proto.ColumnKind)77 },
    };

    [Theory]
    [MemberData(nameof(Contradictions), DisableDiscoveryEnumeration = true)]
    public void A_record_that_contradicts_itself_is_refused_with_the_contradiction(string message, Action<Proto.RunRecord> forge)
    {
        var record = RecordMapping.ToMessage(SampleRecord.Build());
        forge(record);

        var fault = Refused(RecordFaultKind.Inconsistent, RecordHeader.Wrap(record.ToByteArray()));

        Assert.Equal(message, fault.Message);
    }

    private static void Swell(Proto.Digest digest)
    {
        while (digest.Means.Count < 9)
        {
            digest.Means.Add(7);
            digest.Weights.Add(1);
            digest.Atoms.Add(true);
        }
    }

    private static RecordFault Refused(RecordFaultKind kind, byte[] file)
    {
        var reading = RecordReader.Read(file);
        Assert.Null(reading.Record);
        Assert.NotNull(reading.Fault);
        Assert.Equal(kind, reading.Fault.Kind);
        return reading.Fault;
    }
}
