using YamlDotNet.Core;

namespace Swarm.Engine.Models.Documents;

/// <summary>Says what a YAML syntax error means for a model.</summary>
internal static class SyntaxHint
{
    public const string BlockStyle = "write this entry in block style: a line of its own, without { } or [ ] around it";

    /// <summary>Words for what the parser has none for.</summary>
    public const string Malformed = "malformed text behind this place";

    // Matched against the parser's own words, in this order.
    private static readonly (string Words, string Message, string Hint)[] Known =
    [
        ("tab ", "a tab stands where YAML wants spaces", "indent with spaces"),
        ("quoted scalar, found unexpected end", "a quote is opened and never closed", "close it"),
        ("wrong indentation",
            "a quote is not closed, or the lines within it are not indented under their key",
            "close it, or indent them"),
        ("Block sequence entries are not allowed",
            "a list cannot begin behind a key on its line",
            "quote a value that begins with '- ', or begin the list on the next line"),
        ("found invalid mapping",
            "this ': ' cannot stand here",
            "quote a value that holds ': ', indent entries of one mapping alike, and end the key above with ':'"),
        ("Mapping values are not allowed",
            "this ': ' cannot stand here",
            "quote a value that holds ': ', indent entries of one mapping alike, and end the key above with ':'"),
        ("cannot start any token", "no value begins with this character", "put the value in quotes"),
        ("did not find expected key",
            "this line belongs to no entry",
            "write 'key: value', with a space behind the colon, indented like its neighbours"),
        ("could not find expected ':'", "this line has no ': '", "write 'key: value', with a space behind the colon"),
        (Malformed, "what follows is no YAML", "put values with special characters in quotes"),
        ("unexpected end of stream", "the document ends in the middle of an entry", "close what is open"),
    ];

    /// <summary>Tells a syntax error at its place.</summary>
    public static void Report(YamlException exception, SourceText source, DiagnosticList diagnostics)
    {
        int index = (int)Math.Clamp(exception.Start.Index, 0, source.Text.Length);
        if (exception.Message.Contains("tab ", StringComparison.Ordinal) && IndexOfTab(source.Text) is int tab)
        {
            index = tab;
        }

        (string message, string? hint) = Explain(exception.Message, source.LineAt(index));
        diagnostics.Error(source.PositionAt(index), message, hint);
    }

    private static (string Message, string? Hint) Explain(string words, string line)
    {
        bool isFlow = words.Contains("flow", StringComparison.Ordinal);
        if (isFlow && (line.Contains('(', StringComparison.Ordinal) || HasIndex(line)))
        {
            return ("YAML's { } and [ ] cannot hold entries with an index or a call", BlockStyle);
        }

        if (isFlow)
        {
            return ("a { or [ is not closed, or a comma is missing", "close it, or write one entry a line");
        }

        foreach ((string known, string message, string hint) in Known)
        {
            if (words.Contains(known, StringComparison.Ordinal))
            {
                return (message, hint);
            }
        }

        return ($"not YAML: {words.TrimEnd('.')}", null);
    }

    /// <summary>The first tab that indents a line; the parser's own mark is where the mapping began.</summary>
    private static int? IndexOfTab(string text)
    {
        bool isIndentation = true;
        for (int i = 0; i < text.Length; i++)
        {
            if (isIndentation && text[i] == '\t')
            {
                return i;
            }

            isIndentation = text[i] == '\n' || (isIndentation && text[i] == ' ');
        }

        return null;
    }

    private static bool HasIndex(string line)
    {
        for (int i = 1; i < line.Length; i++)
        {
            if (line[i] == '[' && (char.IsLetterOrDigit(line[i - 1]) || line[i - 1] == '_'))
            {
                return true;
            }
        }

        return false;
    }
}
