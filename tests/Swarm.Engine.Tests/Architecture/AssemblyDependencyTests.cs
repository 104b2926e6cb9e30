using System.Xml.Linq;

namespace Swarm.Engine.Tests.Architecture;

public sealed class AssemblyDependencyTests
{
    // The engine computes: it reaches no network, no database, no log and no other process.
    private static readonly string[] Banned =
    [
        "Google.Protobuf", "Grpc", "Microsoft.Data", "Microsoft.EntityFrameworkCore", "Microsoft.Extensions",
        "NLog", "Npgsql", "Serilog", "System.Data", "System.Net",
        "System.Diagnostics.EventLog", "System.Diagnostics.Process", "System.Diagnostics.TraceSource",
    ];

    // Every project under src and the projects of ours that it may reference.
    private static readonly Dictionary<string, string[]> Allowed = new()
    {
        ["Swarm.Engine"] = [],
        ["Swarm.Protocol"] = ["Swarm.Engine"],
        ["Swarm.Cli"] = ["Swarm.Protocol"],
    };

    [Fact]
    public void The_engine_references_no_network_database_log_or_process_assembly()
    {
        string[] references = [.. typeof(Edition).Assembly.GetReferencedAssemblies().Select(name => name.Name!)];

        Assert.NotEmpty(references);
        Assert.DoesNotContain(references, IsBanned);
    }

    [Fact]
    public void Projects_reference_each_other_one_way()
    {
        Dictionary<string, string[]> found = SourceTree.Files("src", "*.csproj").ToDictionary(ProjectName, References);

        Assert.Equal(Allowed.Keys.Order(), found.Keys.Order());
        Assert.All(found, project => Assert.Equal(Allowed[project.Key], project.Value));
    }

    [Fact]
    public void Nothing_but_its_tests_references_the_command()
    {
        string[] users =
        [
            .. from file in SourceTree.Files("", "*.csproj")
               where References(file).Contains("Swarm.Cli")
               select ProjectName(file),
        ];

        Assert.Equal(["Swarm.Cli.Tests"], users);
    }

    private static bool IsBanned(string name) =>
        Banned.Any(banned => name == banned || name.StartsWith(banned + '.', StringComparison.Ordinal));

    private static string ProjectName(string path) => Path.GetFileNameWithoutExtension(path);

    private static string[] References(string project) =>
    [
        .. from reference in XDocument.Load(project).Descendants("ProjectReference")
           let path = (string)reference.Attribute("Include")!
           select ProjectName(path.Replace('\\', '/')),
    ];
}
