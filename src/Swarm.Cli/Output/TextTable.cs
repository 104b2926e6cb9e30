using System.Text;

namespace Swarm.Cli.Output;

/// <summary>A table of plain text. One that is too wide is cut into several below each other, each with the first column.</summary>
internal sealed class TextTable(params TextColumn[] columns)
{
    private const string Margin = "  ";
    private readonly List<string[]> _rows = [];

    public void Add(params string[] cells)
    {
        ArgumentOutOfRangeException.ThrowIfNotEqual(cells.Length, columns.Length);
        _rows.Add(cells);
    }

    public void Write(TextWriter output, int width)
    {
        int[] widths = [.. columns.Select((column, i) => _rows.Select(row => row[i].Length).Append(column.Heading.Length).Max())];
        var next = 1;
        do
        {
            var first = next;
            var used = Margin.Length + widths[0];
            while (next < columns.Length && (next == first || used + Margin.Length + widths[next] <= width))
                used += Margin.Length + widths[next++];
            if (first > 1) output.WriteLine();
            WritePart(output, widths, [0, .. Enumerable.Range(first, next - first)]);
        }
        while (next < columns.Length);
    }

    private void WritePart(TextWriter output, int[] widths, int[] part)
    {
        if (part.Any(i => columns[i].Heading.Length > 0))
            WriteLine(output, [.. columns.Select(column => column.Heading)], widths, part);
        foreach (var row in _rows) WriteLine(output, row, widths, part);
    }

    private void WriteLine(TextWriter output, string[] cells, int[] widths, int[] part)
    {
        var line = new StringBuilder();
        foreach (var i in part)
        {
            line.Append(Margin);
            line.Append(columns[i].ToTheRight ? cells[i].PadLeft(widths[i]) : cells[i].PadRight(widths[i]));
        }

        output.WriteLine(line.ToString().TrimEnd());
    }
}

/// <summary>A column of a <see cref="TextTable"/>.</summary>
/// <param name="Heading">Heading, or empty.</param>
/// <param name="ToTheRight">True to align its cells to the right.</param>
internal sealed record TextColumn(string Heading, bool ToTheRight = true);
