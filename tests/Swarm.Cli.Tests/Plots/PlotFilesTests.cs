using System.Buffers.Binary;
using System.Xml.Linq;
using Swarm.Cli.Plots;
using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Plots;

public sealed class PlotFilesTests(SampleRecord sample) : IClassFixture<SampleRecord>, IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("swarm-").FullName;

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    [Fact]
    public void Every_picture_is_drawn_as_svg_and_png()
    {
        var written = Draw(ErrorMethod.ClosedForm);

        string[] names =
        [
            "fund-5--density", "fund-5--exceedance", "fund-t--steps",
            "motor-residuals-by-calendar", "motor-residuals-by-development", "motor-residuals-by-origin",
            "motor.unpaid-density", "motor.unpaid-exceedance", "motor.unpaid-payments",
            "ruined-density", "shortfall-density", "shortfall-exceedance",
        ];
        Assert.Equal(
            names.SelectMany(name => new[] { $"{name}.png", $"{name}.svg" }),
            written.Select(Path.GetFileName).Order(StringComparer.Ordinal));
        Assert.Equal(written.Order(StringComparer.Ordinal), Directory.GetFiles(_folder).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void A_png_has_the_size_of_the_sheet()
    {
        Draw(ErrorMethod.Batches);

        var png = File.ReadAllBytes(Path.Combine(_folder, "motor.unpaid-density.png"));
        Assert.Equal(Sheet.Width, BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(16)));
        Assert.Equal(Sheet.Height, BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(20)));
    }

    [Fact]
    public void An_svg_names_title_unit_and_typeface_with_a_fallback()
    {
        Draw(ErrorMethod.ClosedForm);

        var texts = XDocument.Load(Path.Combine(_folder, "motor.unpaid-density.svg")).Descendants()
            .Where(element => element.Name.LocalName == "text").ToArray();
        Assert.Contains(texts, text => text.Value.Trim() == "motor.unpaid: distribution of 20,000 trials");
        Assert.Contains(texts, text => text.Value.Trim() == "motor.unpaid, in units of 1,000 crown");
        Assert.All(texts, text => Assert.EndsWith(", sans-serif", (string?)text.Attribute("font-family"), StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("motor.unpaid", "motor.unpaid")]
    [InlineData("fund[30]", "fund-30")]
    [InlineData("../../etc/passwd", "etc-passwd")]
    [InlineData("prämie:a*b", "pr-mie-a-b")]
    public void File_names_hold_letters_digits_dots_and_dashes_alone(string name, string file) => Assert.Equal(file, PlotFiles.FileName(name));

    [Fact]
    public void Drawing_stops_between_pictures()
    {
        using var interrupt = new CancellationTokenSource();
        var written = new List<string>();

        foreach (var file in PlotFiles.Write(sample.Record, ErrorMethod.ClosedForm, _folder, interrupt.Token))
        {
            written.Add(file);
            if (written.Count == 2) interrupt.Cancel();
        }

        Assert.Equal(2, written.Count);
    }

    private List<string> Draw(ErrorMethod errors) =>
        [.. PlotFiles.Write(sample.Record, errors, _folder, TestContext.Current.CancellationToken)];
}
