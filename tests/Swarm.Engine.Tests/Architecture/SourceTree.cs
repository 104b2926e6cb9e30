namespace Swarm.Engine.Tests.Architecture;

/// <summary>The working tree that the tests were built from.</summary>
internal static class SourceTree
{
    private static readonly string[] Skipped = ["bin", "obj", "node_modules", "TestResults", "BenchmarkDotNet.Artifacts", "runs"];

    /// <summary>The folder that holds the solution.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>Files below a folder of the tree, without what a build, an editor or Git leaves there.</summary>
    public static IReadOnlyList<string> Files(string folder, string pattern) =>
        [.. Walk(Path.Combine(Root, folder), pattern).Order(StringComparer.Ordinal)];

    /// <summary>The path from the root, with forward slashes.</summary>
    public static string Relative(string path) => Path.GetRelativePath(Root, path).Replace('\\', '/');

    private static IEnumerable<string> Walk(string folder, string pattern)
    {
        foreach (string file in Directory.EnumerateFiles(folder, pattern))
        {
            yield return file;
        }

        foreach (string child in Directory.EnumerateDirectories(folder).Where(IsOurs))
        {
            foreach (string file in Walk(child, pattern))
            {
                yield return file;
            }
        }
    }

    // .ci holds our own scripts; other hidden folders belong to tools.
    private static bool IsOurs(string folder)
    {
        string name = Path.GetFileName(folder);
        return !Skipped.Contains(name) && (!name.StartsWith('.') || name == ".ci");
    }

    private static string FindRoot()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "Swarm.sln")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException($"No Swarm.sln above {AppContext.BaseDirectory}: run the tests from a checkout.");
    }
}
