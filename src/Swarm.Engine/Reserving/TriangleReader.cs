using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>Reads a triangle from a CSV file.</summary>
/// <remarks>
/// UTF-8; fields are separated by the first of tab, semicolon, comma and bar that the header holds. Empty lines and lines that
/// begin with # are left out. The order of rows and columns means nothing.
/// </remarks>
public static class TriangleReader
{
    /// <summary>Reads a file.</summary>
    /// <param name="request">The file and how it is to be read.</param>
    /// <returns>The triangle, or null after an error; all errors and warnings, in the order of the file.</returns>
    public static (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics) Read(TriangleRequest request)
    {
        var faults = new TriangleFaults(request.FileName);
        IReadOnlyList<CsvField[]> rows = CsvTable.Read(request.Content, faults);
        Triangle? triangle = rows.Count == 0 ? null : Read(rows, request, faults);
        return (faults.HasErrors ? null : triangle, faults.InOrder());
    }

    private static Triangle? Read(IReadOnlyList<CsvField[]> rows, TriangleRequest request, TriangleFaults faults)
    {
        TriangleLayout? layout = LayoutOf(rows[0], request, faults);
        if (layout is null)
        {
            return null;
        }

        IReadOnlyList<TriangleCell> cells = layout == TriangleLayout.Long
            ? LongTable.Read(rows, request, faults)
            : SquareTable.Read(rows, faults);
        if (rows.Count == 1)
        {
            faults.Error(rows[0][0].Position, "there is a header but no row below it", "give a row for each cell or origin");
        }

        return cells.Count > 0 ? TriangleAssembly.Of(cells, request, faults) : null;
    }

    private static TriangleLayout? LayoutOf(CsvField[] header, TriangleRequest request, TriangleFaults faults)
    {
        string[] names = [request.OriginColumn, request.DevelopmentColumn, request.AmountColumn];
        bool isLong = names.Count(name => LongTable.ColumnOf(header, name) >= 0) >= 2;
        bool isSquare = !isLong && SquareTable.IsHeader(header);
        switch (request.Layout)
        {
            case TriangleLayout.FromHeader when isLong || isSquare:
                return isLong ? TriangleLayout.Long : TriangleLayout.Square;
            case TriangleLayout.FromHeader:
                faults.Error(
                    header[0].Position,
                    $"the header {TriangleFaults.Quote(string.Join(", ", header.Select(field => field.Text)))} is of neither form",
                    $"give the columns {string.Join(", ", names)}; or a square table: the origins first, then a column headed by each "
                    + "development (1, 2, 3 or 12, 24, 36)");
                return null;
            case TriangleLayout.Long when isSquare:
                faults.Error(header[0].Position, "the header is that of a square table", "write layout: square in the model");
                return null;
            case TriangleLayout.Square when isLong:
                faults.Error(header[0].Position, "the header is that of the long form", "write layout: long in the model");
                return null;
            default:
                return request.Layout;
        }
    }
}
