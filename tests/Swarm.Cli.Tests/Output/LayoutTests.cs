using CsCheck;
using Swarm.Cli.Output;

namespace Swarm.Cli.Tests.Output;

public class LayoutTests
{
    private static readonly Gen<string> Words = Gen.String[Gen.Char['a', 'z'], 1, 12].Array[0, 60].Select(words => string.Join(' ', words));

    [Fact]
    public void A_paragraph_keeps_every_word_and_its_width() =>
        Words.Sample(
            text =>
            {
                var output = new StringWriter();
                Paragraph.Write(output, 40, text, "  - ");
                var lines = Lines(output);
                return lines.All(line => line.Length <= 40) && string.Join(' ', lines.Select(line => line[4..])).Trim() == text;
            },
            seed: "0000KqV0Zz3f");

    [Fact]
    public void A_table_aligns_its_columns()
    {
        var output = new StringWriter();
        var table = new TextTable(new TextColumn("name", false), new TextColumn("figure"));
        table.Add("a", "1");
        table.Add("longer", "1,000");

        table.Write(output, 80);

        Assert.Equal(["  name    figure", "  a            1", "  longer   1,000"], Lines(output));
    }

    [Fact]
    public void A_table_that_is_too_wide_continues_below_with_its_first_column()
    {
        var output = new StringWriter();
        var table = new TextTable(new TextColumn("name", false), new TextColumn("first"), new TextColumn("second"));
        table.Add("a", "1", "2");

        table.Write(output, 16);

        Assert.Equal(["  name  first", "  a         1", "", "  name  second", "  a          2"], Lines(output));
    }

    private static string[] Lines(StringWriter output) => output.ToString().TrimEnd('\n', '\r').Split(Environment.NewLine);
}
