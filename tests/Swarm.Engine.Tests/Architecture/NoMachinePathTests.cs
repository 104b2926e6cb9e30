using System.Text.RegularExpressions;

namespace Swarm.Engine.Tests.Architecture;

public sealed partial class NoMachinePathTests
{
    private static readonly string[] TextKinds =
    [
        "", ".cs", ".csproj", ".csv", ".json", ".md", ".props", ".proto", ".py", ".sh", ".sln", ".svg", ".targets", ".txt",
        ".xml", ".yaml", ".yml",
    ];

    [Fact]
    public void No_file_names_a_place_on_somebodys_machine()
    {
        string[] wrong =
        [
            .. from file in SourceTree.Files("", "*")
               where TextKinds.Contains(Path.GetExtension(file))
               from line in File.ReadLines(file).Index()
               where MachinePlace().IsMatch(line.Item)
               select $"{SourceTree.Relative(file)}({line.Index + 1}): {MachinePlace().Match(line.Item).Value}",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    [Theory]
    [InlineData("cd [/]home/someone/swarm")]
    [InlineData("\"[/]work/shared\"")]
    [InlineData("C[:]\\Users\\someone")]
    [InlineData("https://api[.]nuget.org/v3/index.json")]
    public void The_scan_knows_a_machines_place(string broken) =>
        Assert.Matches(MachinePlace(), string.Concat(broken.Where(letter => letter is not ('[' or ']'))));

    [Theory]
    [InlineData("see docs/home/page.md and https://example.org/work/list")]
    [InlineData("net/root/count")]
    public void The_scan_passes_by_other_paths(string line) => Assert.DoesNotMatch(MachinePlace(), line);

    // The brackets keep the pattern from finding itself.
    [GeneratedRegex(@"(?<![\w.])[/](?:home|root|work|Users)[/]\w|\b[A-Z][:]\\\w|api[.]nuget[.]org|nuget[.]pkg[.]")]
    private static partial Regex MachinePlace();
}
