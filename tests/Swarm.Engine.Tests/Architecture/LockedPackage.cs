using System.Text.Json;
using System.Xml.Linq;

namespace Swarm.Engine.Tests.Architecture;

/// <summary>A package that a lock file names.</summary>
internal sealed record LockedPackage(string Id, string Version)
{
    /// <summary>The packages of the projects below a folder, direct and transitive, once each.</summary>
    public static IReadOnlyList<LockedPackage> Below(string folder) =>
    [
        .. SourceTree.Files(folder, "packages.lock.json").SelectMany(In).Distinct()
            .OrderBy(package => package.Id, StringComparer.OrdinalIgnoreCase),
    ];

    /// <summary>The licence expression of the package's own description; for a file or an address, which of them it is.</summary>
    public string Licence()
    {
        XElement? licence = XDocument.Load(Description()).Descendants()
            .SingleOrDefault(element => element.Name.LocalName == "license");
        string? type = (string?)licence?.Attribute("type");
        return type == "expression" ? licence!.Value.Trim() : $"licence given as {type ?? "an address or not at all"}";
    }

    private static IEnumerable<LockedPackage> In(string lockFile)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(lockFile));
        return
        [
            .. from framework in document.RootElement.GetProperty("dependencies").EnumerateObject()
               from package in framework.Value.EnumerateObject()
               where package.Value.GetProperty("type").GetString() != "Project"
               select new LockedPackage(package.Name, package.Value.GetProperty("resolved").GetString()!),
        ];
    }

    // The restore puts every package here, under its name and version in lower case.
    private string Description()
    {
        string folder = Environment.GetEnvironmentVariable("NUGET_PACKAGES")
            ?? Path.Combine(Environment.GetFolderPath(Environment.SpecialFolder.UserProfile), ".nuget", "packages");
        string id = Id.ToLowerInvariant();
        string path = Path.Combine(folder, id, Version.ToLowerInvariant(), $"{id}.nuspec");
        return File.Exists(path)
            ? path
            : throw new FileNotFoundException($"{Id} {Version} is not restored: run dotnet restore Swarm.sln.", path);
    }
}
