using System.Globalization;

namespace Swarm.Engine.Reserving;

/// <summary>The square table: a row for each origin, a column for each development. Empty fields are cells not yet known.</summary>
internal static class SquareTable
{
    /// <summary>True if a header is an origin's, then whole numbers.</summary>
    public static bool IsHeader(CsvField[] header) =>
        header.Length > 1
        && header.Skip(1).All(field => int.TryParse(field.Text, NumberStyles.None, CultureInfo.InvariantCulture, out _));

    /// <summary>The cells that could be read.</summary>
    public static IReadOnlyList<TriangleCell> Read(IReadOnlyList<CsvField[]> rows, TriangleFaults faults)
    {
        int?[] ages = AgesOf(rows[0], faults);
        faults.HasLostCells = ages.Skip(1).Contains(null);
        List<TriangleCell> cells = [];
        Dictionary<OriginPeriod, int> lines = [];
        foreach (CsvField[] row in rows.Skip(1))
        {
            if (row.Length > rows[0].Length)
            {
                faults.Error(
                    row[rows[0].Length].Position, $"the row has {row.Length} fields, the header {rows[0].Length}",
                    "give a field for each column; amounts have no thousands separators");
                faults.HasLostCells = true;
            }
            else if (LongTable.OriginOf(row[0], faults) is { } origin)
            {
                if (!lines.TryAdd(origin, row[0].Position.Line))
                {
                    faults.Error(row[0].Position, $"origin {origin} stands twice; first on line {lines[origin]}", "give each origin one row");
                }
                else if (!AddCells(origin, row, ages, cells, faults))
                {
                    break;
                }
            }
            else
            {
                faults.HasLostCells = true;
            }
        }

        return cells;
    }

    private static int?[] AgesOf(CsvField[] header, TriangleFaults faults)
    {
        var ages = new int?[header.Length];
        for (int k = 1; k < header.Length; k++)
        {
            ages[k] = LongTable.AgeOf(header[k], faults);
            if (ages[k] is not null && Array.IndexOf(ages, ages[k]) < k)
            {
                faults.Error(header[k].Position, $"development {ages[k]} heads two columns", "give each development one column");
                ages[k] = null;
            }
        }

        return ages;
    }

    private static bool AddCells(
        OriginPeriod origin, CsvField[] row, int?[] ages, List<TriangleCell> cells, TriangleFaults faults)
    {
        int before = cells.Count;
        for (int k = 1; k < row.Length; k++)
        {
            if (row[k].Text.Length == 0 || ages[k] is not { } age)
            {
                continue;
            }

            if (cells.Count == TriangleBounds.Cells)
            {
                faults.Error(row[k].Position, $"there are more than {TriangleBounds.Cells} cells", "give a smaller triangle");
                return false;
            }

            cells.Add(new TriangleCell(origin, age, LongTable.AmountOf(row[k], faults), row[k].Position));
        }

        if (cells.Count == before)
        {
            faults.Error(row[0].Position, $"origin {origin} has no amounts", "give its amounts, or leave the row out");
        }

        return true;
    }
}
