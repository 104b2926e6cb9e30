using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>Reads a triangle from a CSV file.</summary>
/// <remarks>
/// Fields are separated by the first of tab, semicolon, comma and bar that the header holds. Empty lines and lines that begin with
/// # are left out. The order of rows and columns means nothing.
/// </remarks>
public static class TriangleReader
{
    /// <summary>Reads the file that a model asks for.</summary>
    public static (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics) Read(TriangleRequest request)
    {
        var format = new TriangleFormat
        {
            Amounts = request.Amounts,
            Layout = request.Layout,
            OriginColumn = request.OriginColumn,
            DevelopmentColumn = request.DevelopmentColumn,
            AmountColumn = request.AmountColumn,
            MonthsPerPeriod = request.MonthsPerPeriod,
            AsOf = request.AsOf,
        };
        TriangleReading reading = Read(request.FileName, request.Content, format);
        return (reading.Triangle, reading.Diagnostics);
    }

    /// <summary>Reads a file.</summary>
    /// <param name="file">Its name, for messages.</param>
    /// <param name="content">Its bytes, UTF-8.</param>
    /// <param name="format">How it is to be read.</param>
    /// <returns>The triangle, or all errors with their places.</returns>
    public static TriangleReading Read(string file, ReadOnlySpan<byte> content, TriangleFormat format)
    {
        var faults = new TriangleFaults(file);
        IReadOnlyList<CsvField[]> rows = CsvTable.Read(content, faults);
        Triangle? triangle = rows.Count == 0 ? null : Read(rows, format, faults);
        return new TriangleReading(faults.HasErrors ? null : triangle, faults.InOrder());
    }

    private static Triangle? Read(IReadOnlyList<CsvField[]> rows, TriangleFormat format, TriangleFaults faults)
    {
        IReadOnlyList<TriangleCell>? cells = LayoutOf(rows[0], format) switch
        {
            TriangleLayout.Long => LongTable.Read(rows, format, faults),
            TriangleLayout.Square => SquareTable.Read(rows, faults),
            _ => null,
        };
        if (cells is null)
        {
            faults.Error(
                rows[0][0].Position,
                $"the header {TriangleFaults.Quote(string.Join(", ", rows[0].Select(field => field.Text)))} is of neither form",
                $"give the columns {format.OriginColumn}, {format.DevelopmentColumn}, {format.AmountColumn}; or a square table: the "
                + "origins first, then a column headed by each development (1, 2, 3 or 12, 24, 36)");
            return null;
        }

        if (rows.Count == 1)
        {
            faults.Error(rows[0][0].Position, "there is a header but no row below it", "give a row for each cell or origin");
            return null;
        }

        return cells.Count > 0 ? TriangleAssembly.Of(cells, format, faults) : null;
    }

    private static TriangleLayout LayoutOf(CsvField[] header, TriangleFormat format)
    {
        if (format.Layout != TriangleLayout.FromHeader)
        {
            return format.Layout;
        }

        int named = new[] { format.OriginColumn, format.DevelopmentColumn, format.AmountColumn }
            .Count(name => LongTable.ColumnOf(header, name) >= 0);
        return named >= 2 ? TriangleLayout.Long
            : SquareTable.IsHeader(header) ? TriangleLayout.Square
            : TriangleLayout.FromHeader;
    }
}
