namespace Swarm.Engine.Tests;

/// <summary>Data files that are copied beside the tests.</summary>
internal static class TestFile
{
    public static string Path(string name) => System.IO.Path.Combine(AppContext.BaseDirectory, "Data", name);

    /// <summary>Lines that are neither empty nor comments.</summary>
    public static IEnumerable<string> Lines(string name) =>
        File.ReadLines(Path(name)).Where(line => line.Length > 0 && !line.StartsWith('#'));
}
