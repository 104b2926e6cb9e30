namespace Swarm.Engine.Tests.Models;

/// <summary>Documents of <c>Data/models</c> with what is to be told about them.</summary>
/// <param name="Name">What is wrong.</param>
/// <param name="Kind">Who can notice: structure, meaning, yaml.</param>
/// <param name="Text">The document.</param>
/// <param name="Told">Lines to be told, without the file's name.</param>
internal sealed record RefusedModel(string Name, string Kind, string Text, IReadOnlyList<string> Told)
{
    private const string Head = "=== ";
    private const string Behind = "--- told";

    public static IReadOnlyList<RefusedModel> All { get; } =
        [.. File.ReadAllText(TestFile.Path("models/refused.txt")).Split("\n" + Head).Skip(1).Select(Parse)];

    private static RefusedModel Parse(string section)
    {
        string[] lines = section.TrimEnd('\n').Split('\n');
        int kind = lines[0].LastIndexOf('[');
        int told = Array.IndexOf(lines, Behind);
        return new RefusedModel(
            lines[0][..kind].Trim(), lines[0][(kind + 1)..].TrimEnd(']'), string.Join('\n', lines[1..told]), lines[(told + 1)..]);
    }
}
