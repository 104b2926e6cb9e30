using System.Globalization;

namespace Swarm.Engine.Reserving;

/// <summary>The long form: a row for each cell. Other columns than the three are left alone.</summary>
internal static class LongTable
{
    /// <summary>The cells that could be read.</summary>
    public static IReadOnlyList<TriangleCell> Read(IReadOnlyList<CsvField[]> rows, TriangleRequest request, TriangleFaults faults)
    {
        CsvField[] header = rows[0];
        int origin = Find(header, request.OriginColumn, faults);
        int development = Find(header, request.DevelopmentColumn, faults);
        int amount = Find(header, request.AmountColumn, faults);
        List<TriangleCell> cells = [];
        if (origin < 0 || development < 0 || amount < 0)
        {
            return cells;
        }

        foreach (CsvField[] row in rows.Skip(1))
        {
            if (row.Length != header.Length)
            {
                faults.Error(
                    row[0].Position, $"the row has {row.Length} field{(row.Length == 1 ? "" : "s")}, the header {header.Length}",
                    "give a field for each column; amounts have no thousands separators");
                faults.HasLostCells = true;
                continue;
            }

            if (cells.Count == TriangleBounds.Cells)
            {
                faults.Error(row[0].Position, $"there are more than {TriangleBounds.Cells} cells", "give a smaller triangle");
                break;
            }

            TriangleCell? cell = CellOf(row[origin], row[development], row[amount], faults);
            if (cell is null)
            {
                faults.HasLostCells = true;
            }
            else
            {
                cells.Add(cell);
            }
        }

        return cells;
    }

    /// <summary>Number of the column with a header, whatever its case; -1 if there is none.</summary>
    public static int ColumnOf(CsvField[] header, string name) =>
        Array.FindIndex(header, field => field.Text.Equals(name.Trim(), StringComparison.OrdinalIgnoreCase));

    private static int Find(CsvField[] header, string name, TriangleFaults faults)
    {
        int column = ColumnOf(header, name);
        if (column < 0)
        {
            faults.Error(
                header[0].Position, $"there is no column {TriangleFaults.Quote(name)}",
                $"the columns are {TriangleFaults.Quote(string.Join(", ", header.Select(field => field.Text)))}; name the right one in the model");
        }

        return column;
    }

    private static TriangleCell? CellOf(CsvField origin, CsvField development, CsvField amount, TriangleFaults faults)
    {
        OriginPeriod? period = OriginOf(origin, faults);
        int? age = AgeOf(development, faults);
        double value = AmountOf(amount, faults);
        return period is null || age is null ? null : new TriangleCell(period.Value, age.Value, value, amount.Position);
    }

    /// <summary>The origin period that a field names, or null after an error.</summary>
    public static OriginPeriod? OriginOf(CsvField field, TriangleFaults faults)
    {
        OriginPeriod? period = OriginPeriod.Parse(field.Text);
        if (period is null)
        {
            faults.Error(
                field.Position, $"{TriangleFaults.Quote(field.Text)} is not an origin period", "give a year (2017) or a quarter (2017Q3)");
        }

        return period;
    }

    /// <summary>The development that a field names, or null after an error.</summary>
    public static int? AgeOf(CsvField field, TriangleFaults faults)
    {
        const int Most = TriangleBounds.Developments * OriginPeriod.Yearly;
        if (int.TryParse(field.Text, NumberStyles.None, CultureInfo.InvariantCulture, out int age) && age is >= 1 and <= Most)
        {
            return age;
        }

        faults.Error(
            field.Position, $"{TriangleFaults.Quote(field.Text)} is not a development period",
            "give the age at its end in periods (1, 2, 3) or in months (12, 24, 36; quarterly 3, 6, 9)");
        return null;
    }

    /// <summary>The amount in a field, or NaN after an error.</summary>
    public static double AmountOf(CsvField field, TriangleFaults faults)
    {
        double value = PlainNumber.Parse(field.Text, out string? message, out string hint);
        if (message is not null)
        {
            faults.Error(field.Position, message, hint);
        }

        return value;
    }
}
