namespace Swarm.Engine.Models.Documents;

/// <summary>The text of a document with its lines, so that an index becomes a place.</summary>
internal sealed class SourceText
{
    private const char ByteOrderMark = '\uFEFF';

    private readonly List<int> _lineStarts = [0];

    public SourceText(string fileName, string text)
    {
        FileName = fileName;
        Text = text.Length > 0 && text[0] == ByteOrderMark ? text[1..] : text;
        for (int i = 0; i < Text.Length; i++)
        {
            bool endsLine = Text[i] == '\n' || (Text[i] == '\r' && (i + 1 == Text.Length || Text[i + 1] != '\n'));
            if (endsLine)
            {
                _lineStarts.Add(i + 1);
            }
        }
    }

    public string FileName { get; }

    /// <summary>The text without a byte order mark.</summary>
    public string Text { get; }

    /// <summary>Line and column of an index into <see cref="Text"/>.</summary>
    public SourcePosition PositionAt(int index)
    {
        int found = _lineStarts.BinarySearch(index);
        int line = found >= 0 ? found : ~found - 1;
        return new SourcePosition(FileName, line + 1, index - _lineStarts[line] + 1);
    }

    /// <summary>The line that holds an index, without its end.</summary>
    public string LineAt(int index)
    {
        int line = PositionAt(Math.Clamp(index, 0, Text.Length)).Line - 1;
        int end = line + 1 < _lineStarts.Count ? _lineStarts[line + 1] : Text.Length;
        return Text[_lineStarts[line]..end].TrimEnd('\r', '\n');
    }

    /// <summary>
    /// Index of the first character that no document may hold: control characters, halves of surrogate pairs, and the marks that
    /// make a line look different from what it says. -1 if there is none.
    /// </summary>
    public int IndexOfForbidden()
    {
        for (int i = 0; i < Text.Length; i++)
        {
            char c = Text[i];
            bool isPair = char.IsHighSurrogate(c) && i + 1 < Text.Length && char.IsLowSurrogate(Text[i + 1]);
            if (isPair)
            {
                i++;
            }
            else if (IsForbidden(c))
            {
                return i;
            }
        }

        return -1;
    }

    private static bool IsForbidden(char c) =>
        (char.IsControl(c) && c is not ('\t' or '\n' or '\r'))
        || char.IsSurrogate(c)
        || c is '\u2028' or '\u2029' or (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069') or ByteOrderMark;
}
