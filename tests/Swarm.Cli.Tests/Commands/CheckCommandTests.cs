namespace Swarm.Cli.Tests.Commands;

public sealed class CheckCommandTests : IDisposable
{
    private readonly CommandFixture _swarm = new();

    public void Dispose() => _swarm.Dispose();

    [Fact]
    public async Task A_sound_model_is_summed_up()
    {
        var code = await _swarm.RunAsync("check", _swarm.Write("fund.yaml", SampleModels.Fund));

        Assert.Equal(0, code);
        Assert.Equal("", _swarm.Error);
        Assert.Matches(@"equity\[t\] +lognormal +1\.07 +0\.16 +0\.45194", _swarm.Out);
        Assert.Matches(@"shock +one of +-0\.008 +0\.056 +-6\.8571", _swarm.Out);
    }

    [Fact]
    public async Task Every_mistake_is_told_with_its_place()
    {
        var path = _swarm.Write("bad.yaml", SampleModels.TwoMistakes);

        var code = await _swarm.RunAsync("check", path);

        Assert.Equal(1, code);
        Assert.Equal("", _swarm.Out);
        var lines = _swarm.Error.TrimEnd().Split(Environment.NewLine);
        Assert.Equal(2, lines.Length);
        Assert.StartsWith($"{path}:3:21: error: ", lines[0], StringComparison.Ordinal);
        Assert.StartsWith($"{path}:5:6: error: ", lines[1], StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_missing_model_is_refused()
    {
        var code = await _swarm.RunAsync("check", _swarm.PathOf("none.yaml"));

        Assert.Equal(1, code);
        Assert.StartsWith($"swarm: cannot read {_swarm.PathOf("none.yaml")}: ", _swarm.Error, StringComparison.Ordinal);
    }
}
