using System.Text;
using nietras.SeparatedValues;
using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>The fields of a CSV file with their places. Empty lines and lines that begin with # are left out.</summary>
internal static class CsvTable
{
    private const int MaxBytes = 4 * 1024 * 1024;
    private const char Comment = '#';
    private static readonly char[] s_separators = ['\t', ';', ',', '|'];
    private static readonly UTF8Encoding s_utf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>The rows, the header first; empty after an error that leaves nothing to read.</summary>
    public static IReadOnlyList<CsvField[]> Read(ReadOnlySpan<byte> content, TriangleFaults faults)
    {
        string? text = Decode(content, faults);
        if (text is null)
        {
            return [];
        }

        string[] lines = text.Replace("\r\n", "\n", StringComparison.Ordinal).Replace('\r', '\n').Split('\n');
        BlankComments(lines);
        string? header = Array.Find(lines, line => line.AsSpan().Trim().Length > 0);
        if (header is null)
        {
            faults.Error(faults.At(1, 1), "the file is empty", "give a header and a row for each cell or origin");
            return [];
        }

        char separator = Array.Find(s_separators, header.Contains);
        return Split(string.Join('\n', lines), separator == default ? ',' : separator, faults);
    }

    private static string? Decode(ReadOnlySpan<byte> content, TriangleFaults faults)
    {
        if (content.Length > MaxBytes)
        {
            faults.Error(
                faults.At(1, 1), $"the file has {content.Length} bytes; a triangle has at most {MaxBytes}", "give the triangle alone");
            return null;
        }

        ReadOnlySpan<byte> bytes = content.StartsWith(Encoding.UTF8.Preamble) ? content[Encoding.UTF8.Preamble.Length..] : content;
        try
        {
            return s_utf8.GetString(bytes);
        }
        catch (DecoderFallbackException fallback)
        {
            ReadOnlySpan<byte> before = bytes[..Math.Max(0, fallback.Index)];
            int line = 1 + before.Count((byte)'\n');
            int column = before.Length - before.LastIndexOf((byte)'\n');
            faults.Error(faults.At(line, column), "the text is not UTF-8", "save the file as CSV in UTF-8");
            return null;
        }
    }

    /// <summary>Comments become empty lines, so that a quote in one opens no field and line numbers stay.</summary>
    private static void BlankComments(string[] lines)
    {
        for (int k = 0; k < lines.Length; k++)
        {
            if (lines[k].AsSpan().TrimStart().StartsWith([Comment]))
            {
                lines[k] = "";
            }
        }
    }

    private static List<CsvField[]> Split(string text, char separator, TriangleFaults faults)
    {
        List<CsvField[]> rows = [];
        using SepReader reader = Sep.New(separator)
            .Reader(o => o with { HasHeader = false, DisableColCountCheck = true, Unescape = false })
            .FromText(text);
        // Counted here: the reader's own line number is one too high for the first row.
        int line = 1;
        foreach (SepReader.Row row in reader)
        {
            CsvField[] fields = FieldsOf(row, line, faults);
            line++;
            if (row.Span.Contains('\n'))
            {
                faults.Error(QuotePosition(row, fields), "a quote opens a field that does not end on its line", "close the quote");
                return [];
            }

            if (fields.Length > 1 || fields[0].Text.Length > 0)
            {
                rows.Add(fields);
            }
        }

        return rows;
    }

    private static CsvField[] FieldsOf(SepReader.Row row, int line, TriangleFaults faults)
    {
        var fields = new CsvField[row.ColCount];
        int start = 1;
        for (int k = 0; k < fields.Length; k++)
        {
            ReadOnlySpan<char> raw = row[k].Span;
            ReadOnlySpan<char> trimmed = raw.TrimStart();
            int column = trimmed.Length > 0 ? start + raw.Length - trimmed.Length : start;
            fields[k] = new CsvField(Unquote(trimmed.TrimEnd()), faults.At(line, column));
            start += raw.Length + 1;
        }

        return fields;
    }

    private static SourcePosition QuotePosition(SepReader.Row row, CsvField[] fields)
    {
        int k = 0;
        while (!row[k].Span.Contains('\n'))
        {
            k++;
        }

        return fields[k].Position;
    }

    private static string Unquote(ReadOnlySpan<char> field) =>
        field.Length >= 2 && field[0] == '"' && field[^1] == '"'
            ? field[1..^1].Trim().ToString().Replace("\"\"", "\"", StringComparison.Ordinal)
            : field.ToString();
}
