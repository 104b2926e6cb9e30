namespace Swarm.Engine.Tests.Architecture;

public sealed class FolderDependencyTests
{
    // From a folder to the folders that it may use. Models and Reserving are the one pair that know each other:
    // a model holds triangles, and a triangle speaks of its faults in the model's terms.
    private static readonly Dictionary<string, string[]> Allowed = new()
    {
        [""] = [],
        ["Numerics"] = [],
        ["Streams"] = ["Numerics"],
        ["Distributions"] = ["Numerics", "Streams"],
        ["Summaries"] = ["Numerics"],
        ["Reserving"] = ["Distributions", "Models", "Numerics", "Streams"],
        ["Models"] = ["Distributions", "Numerics", "Reserving", "Summaries"],
        ["Plans"] = ["Distributions", "Models", "Numerics", "Reserving", "Streams", "Summaries"],
        ["Records"] = ["Models", "Plans", "Reserving", "Summaries"],
    };

    private static readonly string[] DiagnosticTypes = ["Diagnostic", "Severity", "SourcePosition"];

    [Fact]
    public void A_folder_of_the_engine_uses_only_the_folders_below_it()
    {
        string[] wrong =
        [
            .. from use in FolderGraph.Uses()
               where !Allowed.TryGetValue(use.From, out string[]? below) || !below.Contains(use.To)
               select $"{use.From} may not use {use.To}: {use.Where}",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong.Distinct()));
    }

    [Fact]
    public void Every_allowed_use_of_a_folder_is_made()
    {
        HashSet<(string, string)> made = [.. FolderGraph.Uses().Select(use => (use.From, use.To))];
        string[] idle =
        [
            .. from pair in Edges()
               where !made.Contains(pair)
               select $"{pair.From} does not use {pair.To}: take it off the list.",
        ];

        Assert.True(idle.Length == 0, string.Join('\n', idle));
    }

    [Fact]
    public void Only_models_and_reserving_use_each_other()
    {
        List<(string From, string To)> edges = [.. Edges().Where(edge => edge != ("Reserving", "Models"))];
        var left = Allowed.Keys.ToHashSet();
        while (left.FirstOrDefault(folder => !edges.Any(edge => edge.From == folder && left.Contains(edge.To))) is { } bottom)
        {
            left.Remove(bottom);
        }

        Assert.Empty(left);
    }

    [Fact]
    public void Reserving_names_no_types_of_models_but_its_diagnostics()
    {
        string[] wrong =
        [
            .. from pair in FolderGraph.TypesNamedIn("Reserving")
               where FolderGraph.Folder(pair.Used.Namespace) == "Models" && !DiagnosticTypes.Contains(pair.Used.Name)
               select $"{pair.User} names {pair.Used}",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong.Distinct()));
    }

    [Fact]
    public void A_source_of_reserving_says_no_name_of_models_but_its_diagnostics()
    {
        HashSet<string> foreign =
        [
            .. from type in typeof(Edition).Assembly.GetTypes()
               where FolderGraph.Folder(type.Namespace) == "Models" && !type.IsNested && !DiagnosticTypes.Contains(type.Name)
               select type.Name.Split('`')[0],
        ];
        string[] wrong =
        [
            .. from file in SourceTree.Files("src/Swarm.Engine/Reserving", "*.cs")
               let text = File.ReadAllText(file)
               where text.Contains("Models", StringComparison.Ordinal)
               from word in SourceText.CodeWords(text).Distinct()
               where foreign.Contains(word)
               select $"{SourceTree.Relative(file)} says {word}",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    private static IEnumerable<(string From, string To)> Edges() =>
        from entry in Allowed
        from to in entry.Value
        select (entry.Key, to);
}
