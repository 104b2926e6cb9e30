using Swarm.Engine.Records;

namespace Swarm.Cli.Output;

/// <summary>Tables that components report, as text.</summary>
internal static class ReportTableText
{
    public static void Write(TextWriter output, int width, ReportTable table)
    {
        Paragraph.Write(output, width, $"{table.Component}: {table.Title}");
        var text = new TextTable([.. table.Columns.Select(column => new TextColumn(column.Name, column.Kind != ColumnKind.Label))]);
        for (var row = 0; row < table.Rows; row++) text.Add([.. table.Columns.Select(column => Cell(column, row))]);
        text.Write(output, width);
    }

    private static string Cell(ReportColumn column, int row) => column.Kind switch
    {
        ColumnKind.Label => column.Labels[row],
        _ when double.IsNaN(column.Numbers[row]) => "",
        ColumnKind.Share => NumberText.Percent(Math.Round(column.Numbers[row], 5)),
        ColumnKind.Money => NumberText.AtPlace(column.Numbers[row], Math.Min(0, NumberText.Magnitude(column.Numbers[row]) - 3)),
        ColumnKind.Count => NumberText.AtPlace(column.Numbers[row], 0),
        _ => NumberText.AtPlace(column.Numbers[row], Math.Max(-6, NumberText.Magnitude(column.Numbers[row]) - 4)),
    };
}
