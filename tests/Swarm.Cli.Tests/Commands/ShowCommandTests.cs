namespace Swarm.Cli.Tests.Commands;

public sealed class ShowCommandTests : IDisposable
{
    private readonly CommandFixture _swarm = new();

    public void Dispose() => _swarm.Dispose();

    [Fact]
    public async Task A_truncated_record_is_refused_by_name()
    {
        var path = await RecordAsync();
        Alter(path, bytes => bytes[..1000]);

        var code = await _swarm.RunAsync("show", path);

        Assert.Equal(4, code);
        Assert.Equal("", _swarm.Out);
        Assert.Matches($"^swarm: {path} is refused: the file ends after 948 of [0-9]+ bytes of its contents\\s+$", _swarm.Error);
    }

    [Fact]
    public async Task A_damaged_record_is_refused_by_name()
    {
        var path = await RecordAsync();
        Alter(path, bytes => [.. bytes[..^1], (byte)(bytes[^1] ^ 1)]);

        Assert.Equal(4, await _swarm.RunAsync("show", path));
        Assert.Equal($"swarm: {path} is refused: the contents do not match their checksum", _swarm.Error.TrimEnd());
    }

    [Fact]
    public async Task A_record_of_a_later_format_is_refused_by_name()
    {
        var path = await RecordAsync();
        Alter(path, bytes => [.. bytes[..8], 9, .. bytes[9..]]);

        Assert.Equal(4, await _swarm.RunAsync("show", path));
        Assert.Contains("has format 9, this program reads up to format 1", _swarm.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_missing_record_is_refused_by_name()
    {
        var path = _swarm.PathOf("none.swarm");

        Assert.Equal(4, await _swarm.RunAsync("show", path));
        Assert.Equal($"swarm: {path} is refused: there is no such file", _swarm.Error.TrimEnd());
    }

    [Fact]
    public async Task Batches_give_other_errors_and_the_same_figures()
    {
        var path = await RecordAsync("200_000");
        await _swarm.RunAsync("show", path, "--json");
        var closed = Mean(_swarm.Out);
        await _swarm.RunAsync("show", path, "--json", "--errors", "batches");
        var batches = Mean(_swarm.Out);

        Assert.Equal(closed.Value, batches.Value);
        Assert.NotEqual(closed.Error, batches.Error);
        Assert.InRange(batches.Error / closed.Error, 0.6, 1.6);
    }

    [Fact]
    public async Task Pictures_go_where_they_are_asked_to_and_are_named()
    {
        var path = await RecordAsync();
        var folder = _swarm.PathOf("plots");

        var code = await _swarm.RunAsync("show", path, "--plot", folder);

        Assert.Equal(0, code);
        var files = Directory.GetFiles(folder).Order(StringComparer.Ordinal).ToArray();
        Assert.Equal(
            ["fund-5--density.png", "fund-5--density.svg", "fund-5--exceedance.png", "fund-5--exceedance.svg"], files.Select(Path.GetFileName));
        Assert.All(files, file => Assert.Contains($"swarm: picture {file}", _swarm.Error, StringComparison.Ordinal));
    }

    private async Task<string> RecordAsync(string trials = "20_000")
    {
        var path = _swarm.PathOf("fund.swarm");
        await _swarm.RunAsync("run", _swarm.Write("fund.yaml", SampleModels.Fund), "--trials", trials, "--out", path);
        return path;
    }

    private static void Alter(string path, Func<byte[], byte[]> alter) => File.WriteAllBytes(path, alter(File.ReadAllBytes(path)));

    private static (double Value, double Error) Mean(string json)
    {
        var mean = System.Text.Json.Nodes.JsonNode.Parse(json)!["outcomes"]![0]!["mean"]!;
        return ((double)mean["value"]!, (double)mean["se"]!);
    }
}
