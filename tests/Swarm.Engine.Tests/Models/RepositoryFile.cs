namespace Swarm.Engine.Tests.Models;

/// <summary>Files of the repository that tests keep right: compared as they are, written anew where SWARM_APPROVE=1 is set.</summary>
internal static class RepositoryFile
{
    public static string Path(string relative)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(System.IO.Path.Combine(folder.FullName, "Swarm.sln")))
        {
            folder = folder.Parent;
        }

        Assert.NotNull(folder);
        return System.IO.Path.Combine(folder.FullName, relative);
    }

    public static void AssertIs(string expected, string relative)
    {
        string path = Path(relative);
        if (Environment.GetEnvironmentVariable("SWARM_APPROVE") == "1")
        {
            File.WriteAllText(path, expected);
        }

        Assert.Equal(expected, File.ReadAllText(path));
    }
}
