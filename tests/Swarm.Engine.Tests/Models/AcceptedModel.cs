namespace Swarm.Engine.Tests.Models;

/// <summary>Documents of <c>Data/models</c> that are right.</summary>
internal sealed record AcceptedModel(string Name, string Text)
{
    private const string Head = "\n=== ";

    public static IReadOnlyList<AcceptedModel> All { get; } =
    [
        .. File.ReadAllText(TestFile.Path("models/accepted.txt"))
            .Split(Head)
            .Skip(1)
            .Select(section => section.Split('\n', 2))
            .Select(parts => new AcceptedModel(parts[0], parts[1])),
    ];
}
