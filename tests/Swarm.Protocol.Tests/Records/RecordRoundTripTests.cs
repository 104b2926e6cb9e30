using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;
using Swarm.Protocol.Records;

namespace Swarm.Protocol.Tests.Records;

public class RecordRoundTripTests
{
    [Fact]
    public void A_record_comes_back_with_every_field()
    {
        var record = SampleRecord.Build();

        var read = RecordReader.Read(RecordWriter.ToBytes(record)).Record;

        Assert.NotNull(read);
        Assert.Equal(record.Edition, read.Edition);
        Assert.Equal(record.ToolVersion, read.ToolVersion);
        Assert.Equal(record.Seed, read.Seed);
        Assert.Equal(record.Trials, read.Trials);
        Assert.Equal(record.Title, read.Title);
        Assert.Equal(record.Money, read.Money);
        Assert.Equal(record.Model, read.Model);
        Assert.Equal(record.Data.Single().Name, read.Data.Single().Name);
        Assert.Equal(record.Data.Single().Content.ToArray(), read.Data.Single().Content.ToArray());
        Assert.Equal(record.Notes, read.Notes);
        Assert.Equal(record.Digest, read.Digest);
    }

    [Fact]
    public void Outcomes_come_back_with_requests_groups_and_batches()
    {
        var record = SampleRecord.Build();

        var read = RecordReader.Read(RecordWriter.ToBytes(record)).Record!;

        Assert.Equal(record.Outcomes.Select(Place), read.Outcomes.Select(Place));
        var (expected, actual) = (record.Outcomes[4].Result, read.Outcomes[4].Result);
        Assert.Equal(expected.Request.Name, actual.Request.Name);
        Assert.Equal(Adverse.Low, actual.Request.Adverse);
        Assert.Equal(expected.Request.Levels, actual.Request.Levels);
        Assert.Equal(expected.Request.Thresholds, actual.Request.Thresholds);
        Assert.Equal(expected.Summary.Moments, actual.Summary.Moments);
        Assert.Equal(expected.Summary.Exceedances, actual.Summary.Exceedances);
        Assert.Equal(expected.TrialsPerBatch, actual.TrialsPerBatch);
        Assert.Equal(2, actual.Batches.Count);
        Assert.Equal(expected.Batches[1].Tvar, actual.Batches[1].Tvar);
    }

    private static (OutcomeGroup Group, string Parent, string Label, bool IsMoney) Place(ReportedResult outcome) =>
        (outcome.Group, outcome.Parent, outcome.Label, outcome.IsMoney);

    [Fact]
    public void Tables_come_back_with_empty_cells()
    {
        var record = SampleRecord.Build();

        var read = RecordReader.Read(RecordWriter.ToBytes(record)).Record!;

        var (expected, actual) = (record.Tables.Single(), read.Tables.Single());
        Assert.Equal((expected.Code, expected.Component, expected.Title), (actual.Code, actual.Component, actual.Title));
        for (var i = 0; i < expected.Columns.Count; i++)
        {
            Assert.Equal((expected.Columns[i].Name, expected.Columns[i].Kind), (actual.Columns[i].Name, actual.Columns[i].Kind));
            Assert.Equal(expected.Columns[i].Labels, actual.Columns[i].Labels);
            Assert.Equal(expected.Columns[i].Numbers, actual.Columns[i].Numbers);
        }
    }

    [Fact]
    public void Equal_records_give_equal_bytes() =>
        Assert.Equal(RecordWriter.ToBytes(SampleRecord.Build()), RecordWriter.ToBytes(SampleRecord.Build()));

    [Fact]
    public void A_record_of_format_1_is_read_by_this_version()
    {
        var golden = File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "Data", "format-1.golden"));

        var read = RecordReader.Read(golden);

        Assert.Null(read.Fault);
        Assert.Equal(SampleRecord.Build().Digest, read.Record!.Digest);
        Assert.Equal(golden, RecordWriter.ToBytes(read.Record));
    }
}
