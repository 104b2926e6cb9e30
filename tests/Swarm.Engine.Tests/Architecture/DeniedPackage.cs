namespace Swarm.Engine.Tests.Architecture;

/// <summary>A package whose old versions have a published weakness.</summary>
internal sealed record DeniedPackage(string Id, Version FirstAllowed)
{
    /// <summary>The checked-in list: lines of a package and the first version that is allowed.</summary>
    public static IReadOnlyList<DeniedPackage> All { get; } =
    [
        .. from line in TestFile.Lines("deny-list.txt")
           let parts = line.Split(" < ")
           select new DeniedPackage(parts[0], new(parts[1])),
    ];

    /// <summary>Whether the package is this one at an earlier version; a preview is earlier than its release.</summary>
    public bool Denies(LockedPackage package)
    {
        string[] parts = package.Version.Split('-', 2);
        int order = new Version(parts[0]).CompareTo(FirstAllowed);
        return package.Id.Equals(Id, StringComparison.OrdinalIgnoreCase) && (order < 0 || (order == 0 && parts.Length > 1));
    }
}
