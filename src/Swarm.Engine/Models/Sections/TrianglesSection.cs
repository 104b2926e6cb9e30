using System.Globalization;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Shapes;
using Swarm.Engine.Reserving;
using Swarm.Engine.Reserving.Simulation;

namespace Swarm.Engine.Models.Sections;

/// <summary><c>triangles</c>: reads the data of each and declares its quantities.</summary>
/// <param name="context">What the sections share.</param>
/// <param name="read">Reads a triangle out of a file.</param>
internal sealed class TrianglesSection(
    ReadingContext context, Func<TriangleRequest, (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics)> read)
{
    private const int MonthsPerQuarter = 3;
    private const int MonthsPerYear = 12;

    // Options of a wrong structure read as if they were left out, which is no ground to judge the method on.
    private readonly bool _structureIsRight = !context.Diagnostics.HasErrors;

    public IReadOnlyList<TriangleInput> Read(MappingNode root)
    {
        List<TriangleInput> triangles = [];
        foreach (MappingEntry entry in root.Entries("triangles"))
        {
            if (context.Diagnostics.IsFull)
            {
                break;
            }

            if (NameForm.Component.Read(entry.Key.Text) is QuantityName name)
            {
                context.Names.DeclareComponent(name.Name, entry.Key.Position);
                if (entry.Value is MappingNode options && Triangle(options) is { } triangle && HasPeriods(triangle, options))
                {
                    triangles.Add(Input(name.Name, entry.Key.Position, triangle, options));
                }
            }
        }

        return triangles;
    }

    private Triangle? Triangle(MappingNode options)
    {
        if (options.Scalar("data") is not { } name || context.Data.Find(name, context.Diagnostics) is not { } file)
        {
            return null;
        }

        (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = read(Request(options, file));
        foreach (Diagnostic diagnostic in diagnostics)
        {
            context.Diagnostics.Add(diagnostic);
        }

        return triangle;
    }

    private static TriangleRequest Request(MappingNode options, DataFile file)
    {
        MappingNode? columns = options.Mapping("columns");
        return new TriangleRequest
        {
            FileName = file.Name,
            Content = file.Content,
            Layout = options.Text("layout") switch
            {
                "square" => TriangleLayout.Square,
                "long" => TriangleLayout.Long,
                _ => TriangleLayout.FromHeader,
            },
            Amounts = options.Text("amounts") == "incremental" ? TriangleAmounts.Incremental : TriangleAmounts.Cumulative,
            OriginColumn = columns.Text("origin") ?? "origin",
            DevelopmentColumn = columns.Text("development") ?? "development",
            AmountColumn = columns.Text("amount") ?? "amount",
            MonthsPerPeriod = options.Text("period") == "quarter" ? MonthsPerQuarter : MonthsPerYear,
            AsOf = options.Day("as_of"),
        };
    }

    /// <summary>Origins must be years or quarters, since payment periods are counted on from them.</summary>
    private bool HasPeriods(Triangle triangle, MappingNode options)
    {
        string? odd = triangle.Origins.FirstOrDefault(label => !IsPeriod(label, triangle.MonthsPerPeriod));
        if (odd is not null)
        {
            context.Diagnostics.Error(
                options.Scalar("data")!.Position,
                $"origin {DiagnosticList.Quote(odd)} is no {(triangle.MonthsPerPeriod == MonthsPerYear ? "year" : "quarter")}",
                "years are written 2017, quarters 2017Q3, and 'period' says which it is");
        }

        return odd is null;
    }

    private static bool IsPeriod(string label, int monthsPerPeriod)
    {
        const int YearDigits = 4;
        ReadOnlySpan<char> year = label.AsSpan(0, Math.Min(YearDigits, label.Length));
        bool beginsWithYear = year.Length == YearDigits && int.TryParse(year, NumberStyles.None, CultureInfo.InvariantCulture, out _);
        return beginsWithYear && (monthsPerPeriod == MonthsPerYear
            ? label.Length == YearDigits
            : label.Length == YearDigits + 2 && label[YearDigits] == 'Q' && label[^1] is >= '1' and <= '4');
    }

    /// <summary>Fits the method once, so that a triangle that it cannot be used on is refused here and not by the run.</summary>
    private ReservingFit? Fit(Triangle triangle, ReservingOptions options, SourcePosition position)
    {
        List<Finding> findings = [];
        ReservingFit? fit = ReservingFit.Of(triangle, options, findings);
        foreach (Finding finding in findings)
        {
            context.Diagnostics.Add(finding.At(position));
        }

        return fit;
    }

    private TriangleInput Input(string name, SourcePosition position, Triangle triangle, MappingNode options)
    {
        ReservingOptionsReader reader = new(options, triangle, context.Diagnostics);
        ReservingOptions reserving = reader.Read();
        ReservingFit? fit = _structureIsRight && reader.IsRight ? Fit(triangle, reserving, position) : null;
        int tailPeriods = fit?.ChainLadder.TailPeriods ?? reserving.Tail?.Periods ?? 0;
        TriangleNames names = new(name, triangle, new RunOffShape(triangle, tailPeriods));
        context.Names.DeclareQuantities(name, names.All, perStep: context.Horizon == 0 ? [] : [names.PaidByStep]);
        return new TriangleInput
        {
            Name = name,
            Stream = options.Text("stream") ?? name,
            Triangle = triangle,
            Options = reserving,
            Position = position,
        };
    }
}
