using YamlDotNet.Core;

namespace Swarm.Engine.Models.Documents;

/// <summary>A text value, raw: <c>no</c>, <c>12:30</c> and <c>1_000</c> are what they look like.</summary>
internal sealed class ScalarNode : DocumentNode
{
    private readonly SourceText _source;
    private readonly int _start;
    private readonly int _end;
    private readonly ScalarStyle _style;
    private int[]? _origins;

    public ScalarNode(SourceText source, int start, int end, string text, ScalarStyle style)
        : base(source.PositionAt(start))
    {
        _source = source;
        _start = start;
        _end = end;
        _style = style;
        Text = text;
    }

    public string Text { get; }

    public override int Size => 1;

    public override int Height => 0;

    public override string Kind => IsNothing ? "nothing" : "a text";

    /// <summary>True for text that stands in no quotes.</summary>
    public bool IsPlain => _style == ScalarStyle.Plain;

    /// <summary>True if nothing was written, as after <c>key:</c> at the end of a line, or one of YAML's words for it.</summary>
    public bool IsNothing => IsPlain && (Text is "" or "~" or "null" or "Null" or "NULL");

    /// <summary>Place of a character of <see cref="Text"/>; its length gives the place just behind.</summary>
    public SourcePosition PositionOf(int offset)
    {
        if (IsPlain && _end - _start == Text.Length)
        {
            return _source.PositionAt(_start + Math.Min(offset, Text.Length));
        }

        _origins ??= Origins();
        return _source.PositionAt(offset < _origins.Length ? _origins[offset] : Math.Max(_start, _end - 1));
    }

    /// <summary>
    /// For each character of the value the index in the source that it came from: walks both in step, skipping what YAML adds
    /// (quotes, indentation, line ends). Exact for quoted text without escapes, and as near as can be elsewhere.
    /// </summary>
    private int[] Origins()
    {
        string source = _source.Text;
        int[] origins = new int[Text.Length];
        int at = FirstIndex();
        for (int i = 0; i < Text.Length; i++)
        {
            at = char.IsWhiteSpace(Text[i]) ? at : NextOf(Text[i], at);
            origins[i] = Math.Min(at, Math.Max(_start, _end - 1));
            at = Math.Min(at + 1, _end);
            bool isBreak = char.IsWhiteSpace(Text[i]) && i + 1 < Text.Length && !char.IsWhiteSpace(Text[i + 1]);
            while (isBreak && at < _end && char.IsWhiteSpace(source[at]))
            {
                at++;
            }
        }

        return origins;
    }

    private int FirstIndex()
    {
        bool isBlock = _style is ScalarStyle.Literal or ScalarStyle.Folded;
        if (!isBlock)
        {
            return IsPlain ? _start : _start + 1;
        }

        int lineEnd = _source.Text.IndexOf('\n', _start, _end - _start);
        return lineEnd < 0 ? _start : lineEnd + 1;
    }

    private int NextOf(char wanted, int from)
    {
        const int Reach = 200;
        int found = from < _end ? _source.Text.IndexOf(wanted, from, Math.Min(Reach, _end - from)) : -1;
        return found < 0 ? from : found;
    }
}
