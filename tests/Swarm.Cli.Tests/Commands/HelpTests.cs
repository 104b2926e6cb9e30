using System.CommandLine;

namespace Swarm.Cli.Tests.Commands;

public sealed class HelpTests : IDisposable
{
    private readonly CommandFixture _swarm = new();

    public void Dispose() => _swarm.Dispose();

    [Theory]
    [InlineData("swarm")]
    [InlineData("swarm check")]
    [InlineData("swarm run")]
    [InlineData("swarm show")]
    public async Task Help_is_as_approved_and_fits_eighty_columns(string command)
    {
        var words = command.Split(' ')[1..];

        var code = await _swarm.RunAsync([.. words, "--help"]);

        // The first word is that of the program that runs: here the tests.
        var page = _swarm.Out.Replace(RootCommand.ExecutableName, "swarm", StringComparison.Ordinal).TrimEnd();
        var help = page.Split(Environment.NewLine).Select(line => line.TrimEnd()).ToArray();
        var approved = Path.Combine(AppContext.BaseDirectory, "Data", $"help-{command.Replace(' ', '-')}.txt");
        Assert.Equal(0, code);
        Assert.All(help, line => Assert.InRange(line.Length, 0, 80));
        Assert.Equal(File.ReadAllText(approved).ReplaceLineEndings("\n").TrimEnd(), string.Join('\n', help));
    }
}
