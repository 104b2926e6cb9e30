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
        Triangle? triangle = rows.Count > 0 && IsHeaderGood(rows, request, faults) ? Read(rows, request, faults) : null;
        return (faults.HasErrors ? null : triangle, faults.InOrder());
    }

    private static Triangle? Read(IReadOnlyList<CsvField[]> rows, TriangleRequest request, TriangleFaults faults)
    {
        IReadOnlyList<TriangleCell> cells = request.Layout == TriangleLayout.Long
            ? LongTable.Read(rows, request, faults)
            : SquareTable.Read(rows, faults);
        return cells.Count > 0 ? TriangleAssembly.Of(cells, request, faults) : null;
    }

    private static bool IsHeaderGood(IReadOnlyList<CsvField[]> rows, TriangleRequest request, TriangleFaults faults)
    {
        CsvField[] header = rows[0];
        bool isLong = LongTable.ColumnOf(header, request.OriginColumn) >= 0
            && LongTable.ColumnOf(header, request.AmountColumn) >= 0;
        if (request.Layout == TriangleLayout.Long && SquareTable.IsHeader(header))
        {
            faults.Error(header[0].Position, "the header is that of a square table", "write layout: square in the model");
        }
        else if (request.Layout == TriangleLayout.Square && isLong)
        {
            faults.Error(header[0].Position, "the header is that of the long form", "write layout: long in the model");
        }
        else if (rows.Count == 1)
        {
            faults.Error(header[0].Position, "there is a header but no row below it", "give a row for each cell or origin");
        }

        return !faults.HasErrors;
    }
}
