using System.Text;
using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Models;

public class ModelDocsTests
{
    private static readonly string Page = File.ReadAllText(RepositoryFile.Path("docs/model.md"));

    [Fact]
    public void Every_example_is_read_without_a_word()
    {
        string[] examples = Blocks("yaml");

        Assert.True(examples.Length >= 7);
        Assert.All(examples, example => Assert.Equal("", string.Join('\n', Read(example).Diagnostics)));
    }

    [Fact]
    public void The_wrong_example_is_told_as_the_page_says()
    {
        string told = string.Join('\n', Read(Assert.Single(Blocks("yaml wrong"))).Diagnostics);

        Assert.Equal(Assert.Single(Blocks("text")).TrimEnd(), told);
    }

    [Fact]
    public void Both_layouts_of_the_page_are_the_same_triangle()
    {
        Triangle? longTable = Triangle("csv long", TriangleLayout.Long);
        Triangle? square = Triangle("csv square", TriangleLayout.Square);

        Assert.Equal(["2023", "2024", "2025"], longTable!.Origins);
        Assert.Equal(longTable.Origins, square!.Origins);
        Assert.Equal(longTable.Cumulative(0, 2), square.Cumulative(0, 2));
        Assert.Equal(1, square.Known(2));
    }

    [Fact]
    public void Every_key_of_the_schema_is_explained()
    {
        string schema = ModelSchema.Text();
        IEnumerable<string> keys = schema.Split('\n')
            .Where(line => line.EndsWith("\": {", StringComparison.Ordinal))
            .Select(line => line.Trim().Split('"')[1])
            .Where(key => key is not ("properties" or "items" or "patternProperties") && key[0] != '^');

        Assert.All(keys, key => Assert.Contains($"`{key}", Page, StringComparison.Ordinal));
    }

    [Fact]
    public void Every_distribution_is_listed() =>
        Assert.All(Swarm.Engine.Distributions.DistributionCatalogue.Forms, form => Assert.Contains($"`{form.Signature}`", Page, StringComparison.Ordinal));

    private static Triangle? Triangle(string block, TriangleLayout layout) => TriangleReader.Read(new TriangleRequest
    {
        FileName = block,
        Content = Encoding.UTF8.GetBytes(Assert.Single(Blocks(block))),
        Layout = layout,
        Amounts = TriangleAmounts.Cumulative,
    }).Triangle;

    private static ModelReading Read(string example) => ModelReader.Read(
        Documents.FileName,
        example,
        name => new DataFile(name, []),
        Swarm.Engine.Distributions.DistributionCatalogue.Forms,
        _ => (Documents.Triangle, []));

    private static string[] Blocks(string kind) =>
        [.. Page.Split($"\n```{kind}\n").Skip(1).Select(rest => rest[..(rest.IndexOf("\n```", StringComparison.Ordinal) + 1)])];
}
