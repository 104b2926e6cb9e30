using Swarm.Engine.Records;

namespace Swarm.Cli.Output;

/// <summary>Tables that components report, as text.</summary>
internal static class ReportTableText
{
    private const int Digits = 5;

    public static void Write(TextWriter output, int width, ReportTable table)
    {
        Paragraph.Write(output, width, $"{table.Component}: {table.Title}");
        var text = new TextTable([.. table.Columns.Select(column => new TextColumn(column.Name, column.Kind != ColumnKind.Label))]);
        int[] places = [.. table.Columns.Select(PlaceOf)];
        for (var row = 0; row < table.Rows; row++) text.Add([.. table.Columns.Select((column, i) => Cell(column, row, places[i]))]);
        text.Write(output, width);
    }

    /// <summary>One place for a whole column: five digits of its largest number.</summary>
    private static int PlaceOf(ReportColumn column)
    {
        if (column.Kind is ColumnKind.Label or ColumnKind.Count) return 0;
        var largest = column.Numbers.Where(double.IsFinite).Select(Math.Abs).DefaultIfEmpty(0).Max();
        return Math.Clamp(NumberText.Magnitude(largest) - Digits + 1, -6, 0);
    }

    private static string Cell(ReportColumn column, int row, int place) => column.Kind switch
    {
        ColumnKind.Label => column.Labels[row],
        _ when double.IsNaN(column.Numbers[row]) => "",
        ColumnKind.Share => NumberText.Percent(Math.Round(column.Numbers[row], Digits)),
        _ => NumberText.AtPlace(column.Numbers[row], place),
    };
}
