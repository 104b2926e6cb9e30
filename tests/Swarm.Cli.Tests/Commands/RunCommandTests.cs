using System.Text.Json.Nodes;
using Swarm.Engine.Plans;
using Swarm.Protocol.Records;

namespace Swarm.Cli.Tests.Commands;

public sealed class RunCommandTests : IDisposable
{
    private readonly CommandFixture _swarm = new();

    public void Dispose() => _swarm.Dispose();

    [Fact]
    public async Task A_run_shows_its_figures_and_keeps_a_record_that_shows_the_same()
    {
        var record = _swarm.PathOf("kept/fund.swarm");
        var ran = await _swarm.RunAsync("run", Fund(), "--trials", "30_000", "--seed", "11", "--out", record);
        var page = _swarm.Out;
        var shown = await _swarm.RunAsync("show", record);

        Assert.Equal((0, 0), (ran, shown));
        Assert.Contains("  trials   30,000", page, StringComparison.Ordinal);
        Assert.Equal(page, _swarm.Out);
        Assert.Equal([record], Directory.GetFileSystemEntries(_swarm.PathOf("kept")));
    }

    [Fact]
    public async Task What_is_piped_is_the_result_alone()
    {
        await _swarm.RunAsync("run", Fund(), "--trials", "2000", "--no-record", "--json");

        Assert.Equal("Larkfell pension fund, five years", (string?)JsonNode.Parse(_swarm.Out)!["model"]);
        Assert.DoesNotContain('\e', _swarm.Error);
        Assert.Matches("^swarm: 2,000 trials in [0-9.]+ s, .* trials/s\\s+$", _swarm.Error);
    }

    [Fact]
    public async Task Threads_change_no_result()
    {
        var digests = new List<string>();
        foreach (var threads in new[] { "1", "2", "5" })
        {
            await _swarm.RunAsync("run", Fund(), "--trials", "50_000", "--threads", threads, "--no-record", "--json");
            digests.Add((string)JsonNode.Parse(_swarm.Out)!["digest"]!);
        }

        Assert.Single(digests.Distinct());
    }

    [Fact]
    public async Task The_record_holds_the_model_its_seed_and_no_trace_of_threads()
    {
        var (one, two) = (_swarm.PathOf("one.swarm"), _swarm.PathOf("two.swarm"));
        await _swarm.RunAsync("run", Fund(), "--trials", "20_000", "--threads", "1", "--seed", "18446744073709551615", "--out", one);
        await _swarm.RunAsync("run", Fund(), "--trials", "20_000", "--threads", "2", "--seed", "18446744073709551615", "--out", two);

        var record = RecordReader.Load(one).Record!;
        Assert.Equal(ulong.MaxValue, record.Seed);
        Assert.Equal(SampleModels.Fund, record.Model.Text);
        Assert.Equal(File.ReadAllBytes(one), File.ReadAllBytes(two));
    }

    [Fact]
    public async Task A_model_with_mistakes_is_refused_before_anything_runs()
    {
        var path = _swarm.Write("bad.yaml", SampleModels.TwoMistakes);

        var code = await _swarm.RunAsync((_, _, _, _) => throw new InvalidOperationException("it ran"), CancellationToken.None, "run", path);

        Assert.Equal(1, code);
        Assert.Equal("", _swarm.Out);
    }

    [Fact]
    public async Task A_fault_names_trial_quantity_and_values()
    {
        var code = await _swarm.RunAsync("run", _swarm.Write("fault.yaml", SampleModels.Faulting), "--out", _swarm.PathOf("x.swarm"));

        Assert.Equal(3, code);
        Assert.Equal("", _swarm.Out);
        Assert.Matches("^swarm: the run stopped at trial [0-9]+: b is NaN from a = -[0-9.]+\\s+$", _swarm.Error);
        Assert.False(File.Exists(_swarm.PathOf("x.swarm")));
    }

    [Fact]
    public async Task A_run_whose_result_is_refused_says_why_and_keeps_nothing()
    {
        var code = await _swarm.RunAsync(
            (_, _, _, _) => new RunOutcome { Refusal = "motor: drawn again too often" },
            CancellationToken.None,
            "run",
            Fund(),
            "--out",
            _swarm.PathOf("x.swarm"));

        Assert.Equal(3, code);
        Assert.Equal("", _swarm.Out);
        Assert.Equal("swarm: motor: drawn again too often", _swarm.Error.TrimEnd());
        Assert.False(File.Exists(_swarm.PathOf("x.swarm")));
    }

    [Fact]
    public async Task Stopping_leaves_nothing_behind()
    {
        using var interrupt = new CancellationTokenSource();
        RunOutcome StopAtTheFirstLeaf(Engine.Models.Model model, RunSettings settings, Action<RunProgress>? progress, CancellationToken cancellation) =>
            LocalRun.Execute(model, settings, _ => interrupt.Cancel(), cancellation);

        var code = await _swarm.RunAsync(
            StopAtTheFirstLeaf,
            interrupt.Token,
            ["run", Fund(), "--trials", "1_000_000_000", "--out", _swarm.PathOf("kept/x.swarm"), "--plot", _swarm.PathOf("plots")]);

        Assert.Equal(130, code);
        Assert.Equal("", _swarm.Out);
        Assert.Equal("swarm: stopped before the end; nothing was written", _swarm.Error.TrimEnd());
        Assert.Equal([_swarm.PathOf("fund.yaml")], Directory.GetFileSystemEntries(_swarm.Folder));
    }

    [Fact]
    public async Task A_record_that_cannot_be_written_is_told_beside_the_figures()
    {
        Directory.CreateDirectory(_swarm.PathOf("taken"));

        var code = await _swarm.RunAsync("run", Fund(), "--trials", "2000", "--out", _swarm.PathOf("taken"));

        Assert.Equal(5, code);
        Assert.Contains("fund[5]", _swarm.Out, StringComparison.Ordinal);
        Assert.Contains($"swarm: cannot write {_swarm.PathOf("taken")}: ", _swarm.Error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--trials", "1e6")]
    [InlineData("--trials", "0")]
    [InlineData("--trials", "_5")]
    [InlineData("--trials", "281474976710657")]
    [InlineData("--seed", "-1")]
    [InlineData("--seed", "18446744073709551616")]
    [InlineData("--threads", "0")]
    [InlineData("--errors", "bootstrap")]
    [InlineData("--colour", "always")]
    public async Task A_wrong_option_is_a_mistake_of_usage(string option, string value)
    {
        var code = await _swarm.RunAsync("run", Fund(), option, value);

        Assert.Equal(2, code);
        Assert.Equal("", _swarm.Out);
        Assert.Contains(value, _swarm.Error, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_record_is_either_wanted_or_not()
    {
        var code = await _swarm.RunAsync("run", Fund(), "--no-record", "--out", _swarm.PathOf("x.swarm"));

        Assert.Equal(2, code);
        Assert.StartsWith("swarm: --out and --no-record exclude each other", _swarm.Error, StringComparison.Ordinal);
    }

    private string Fund() => _swarm.Write("fund.yaml", SampleModels.Fund);
}
