using System.Globalization;
using System.Text;
using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>Triangles for tests, and their fits.</summary>
internal static class Triangles
{
    public static readonly string[] Published = ["taylor-ashe", "mw2008", "small4x4"];

    /// <summary>A published triangle from the test data, whose source the file names.</summary>
    public static Triangle Load(string name)
    {
        string file = $"reserving-{name}.csv";
        var request = new TriangleRequest
        {
            FileName = file,
            Content = File.ReadAllBytes(TestFile.Path(file)),
            Layout = TriangleLayout.Square,
        };
        (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = TriangleReader.Read(request);
        Assert.Empty(diagnostics);
        return triangle!;
    }

    /// <summary>A yearly triangle of cumulative amounts, first origin 2001.</summary>
    public static Triangle OfCumulative(params double[][] rows) => new(
        [.. rows.Select((_, i) => (2001 + i).ToString(CultureInfo.InvariantCulture))],
        [.. rows.Select(row => row.Select((c, j) => j == 0 ? c : c - row[j - 1]).ToArray())],
        12);

    /// <summary>A request to read a text as paid.csv: yearly, long, cumulative.</summary>
    public static TriangleRequest Request(string text) => new() { FileName = "paid.csv", Content = Encoding.UTF8.GetBytes(text) };

    public static ChainLadder ChainLadder(Triangle triangle, ReservingOptions? options = null)
    {
        List<Finding> findings = [];
        ChainLadder? fit = Engine.Reserving.ChainLadder.Fit(triangle, options ?? new ReservingOptions(), findings);
        Assert.Empty(findings);
        return fit!;
    }

    public static Mack Mack(Triangle triangle, ReservingOptions? options = null)
    {
        List<Finding> findings = [];
        Mack? fit = Engine.Reserving.Mack.Fit(ChainLadder(triangle, options), findings);
        Assert.Empty(findings);
        return fit!;
    }

    public static OdpFit Odp(Triangle triangle, ReservingOptions? options = null)
    {
        List<Finding> findings = [];
        OdpFit? fit = OdpFit.Fit(ChainLadder(triangle, options), findings);
        Assert.DoesNotContain(findings, finding => finding.Severity == Severity.Error);
        return fit!;
    }

    /// <summary>The one error of a fit that is refused.</summary>
    public static Finding Refusal(Triangle triangle, ReservingOptions options)
    {
        List<Finding> findings = [];
        Assert.Null(ReservingFit.Of(triangle, options, findings));
        return Assert.Single(findings, finding => finding.Severity == Severity.Error);
    }
}
