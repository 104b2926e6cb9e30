using Swarm.Engine.Records;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Mapping;

/// <summary>Tables that components report.</summary>
internal static class TableMapping
{
    public static Proto.ReportTable ToMessage(ReportTable table)
    {
        var message = new Proto.ReportTable { Code = table.Code, Component = table.Component, Title = table.Title };
        message.Columns.AddRange(table.Columns.Select(ToMessage));
        return message;
    }

    public static ReportTable FromMessage(Proto.ReportTable message)
    {
        var table = new ReportTable(message.Code, message.Component, message.Title, [.. message.Columns.Select(FromMessage)]);
        Expect.That(table.Columns.All(column => column.Length == table.Rows), $"the columns of the table {table.Title} differ in length");
        return table;
    }

    private static Proto.ReportColumn ToMessage(ReportColumn column)
    {
        // Both enumerations have one order; the message's zero stands for "not given".
        var message = new Proto.ReportColumn { Name = column.Name, Kind = (Proto.ColumnKind)((int)column.Kind + 1) };
        message.Labels.AddRange(column.Labels);
        message.Numbers.AddRange(column.Numbers);
        return message;
    }

    private static ReportColumn FromMessage(Proto.ReportColumn message)
    {
        var kind = (ColumnKind)((int)message.Kind - 1);
        Expect.That(Enum.IsDefined(kind), $"the column {message.Name} has no known kind");
        return kind == ColumnKind.Label
            ? ReportColumn.OfLabels(message.Name, [.. message.Labels])
            : ReportColumn.OfNumbers(message.Name, kind, [.. message.Numbers]);
    }
}
