using Swarm.Protocol.Records;

namespace Swarm.Protocol.Tests.Records;

public sealed class AtomicFileTests : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("swarm-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void A_record_is_saved_in_a_folder_that_did_not_exist_and_leaves_nothing_else()
    {
        var path = Path.Combine(_folder, "runs", "motor.swarm");

        RecordWriter.Save(SampleRecord.Build(), path);

        Assert.Equal([path], Directory.GetFileSystemEntries(Path.Combine(_folder, "runs")));
        Assert.Equal(SampleRecord.Build().Digest, RecordReader.Load(path).Record?.Digest);
    }

    [Fact]
    public void An_older_file_of_the_name_is_replaced()
    {
        var path = Path.Combine(_folder, "motor.swarm");
        File.WriteAllText(path, "older and longer than what comes");

        AtomicFile.Write(path, "new"u8);

        Assert.Equal("new", File.ReadAllText(path));
    }

    [Fact]
    public void A_write_that_fails_leaves_nothing_behind()
    {
        var path = Path.Combine(_folder, "taken");
        Directory.CreateDirectory(path);

        var fault = Record.Exception(() => AtomicFile.Write(path, "new"u8));

        Assert.True(fault is IOException or UnauthorizedAccessException);
        Assert.Equal([path], Directory.GetFileSystemEntries(_folder));
    }
}
