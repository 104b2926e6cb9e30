namespace Swarm.Engine.Tests.Architecture;

public sealed class LicenceTests
{
    private static readonly IReadOnlyList<LockedPackage> Packages = LockedPackage.Below("src");

    [Fact]
    public void Every_shipped_package_has_an_allowed_licence()
    {
        string[] allowed = [.. TestFile.Lines("licences.txt")];
        string[] wrong =
        [
            .. from package in Packages
               let licence = package.Licence()
               where !allowed.Contains(licence) && !allowed.Contains($"{package.Id}: {licence}")
               select $"{package.Id} {package.Version}: {licence} is not in Data/licences.txt.",
        ];

        Assert.NotEmpty(Packages);
        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    [Fact]
    public void No_project_locks_a_denied_version()
    {
        string[] wrong =
        [
            .. from rule in DeniedPackage.All
               from package in LockedPackage.Below("")
               where rule.Denies(package)
               select $"{package.Id} {package.Version}: versions below {rule.FirstAllowed} are denied.",
        ];

        Assert.NotEmpty(DeniedPackage.All);
        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    [Theory]
    [InlineData("12.0.3", true)]
    [InlineData("13.0.1-beta2", true)]
    [InlineData("13.0.1", false)]
    [InlineData("13.0.3", false)]
    public void A_version_below_the_first_allowed_is_denied(string version, bool denied) =>
        Assert.Equal(denied, new DeniedPackage("Newtonsoft.Json", new Version(13, 0, 1)).Denies(new("newtonsoft.json", version)));

    [Fact]
    public void The_notices_list_every_shipped_package_and_no_other()
    {
        string[] rows =
        [
            .. from line in File.ReadLines(Path.Combine(SourceTree.Root, "THIRD-PARTY-NOTICES.md"))
               where line.StartsWith("| ", StringComparison.Ordinal)
               select string.Join(" | ", line.Split('|', StringSplitOptions.TrimEntries)[1..4]),
        ];
        string[] packages = [.. Packages.Select(package => $"{package.Id} | {package.Version} | {package.Licence()}")];

        Assert.Equal(packages, rows[1..]);
    }
}
