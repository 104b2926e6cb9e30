using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace Swarm.Engine.Models.Documents;

/// <summary>
/// Builds the node tree of a document out of YAML's events. No object deserialiser: scalars stay raw text, every node keeps its
/// place, and what invites mistakes (merge keys, tags, duplicate keys, flow entries without a value) is refused.
/// </summary>
internal sealed class DocumentParser
{
    private readonly SourceText _source;
    private readonly DiagnosticList _diagnostics;
    private readonly Parser _events;
    private readonly EntryCheck _check;
    private readonly Dictionary<string, DocumentNode> _anchors = new(StringComparer.Ordinal);
    private int _nodes;
    private bool _stopped;

    private DocumentParser(SourceText source, DiagnosticList diagnostics)
    {
        _source = source;
        _diagnostics = diagnostics;
        _check = new EntryCheck(diagnostics);
        _events = new Parser(new Scanner(new StringReader(source.Text), skipComments: true));
    }

    /// <summary>The root of the document, or null where it is no YAML or goes beyond a bound.</summary>
    public static DocumentNode? Parse(SourceText source, DiagnosticList diagnostics)
    {
        int forbidden = source.IndexOfForbidden();
        if (forbidden >= 0)
        {
            diagnostics.Error(
                source.PositionAt(forbidden),
                $"character U+{(int)source.Text[forbidden]:X4} may not stand in a model",
                "save the file as plain UTF-8 text");
            return null;
        }

        DocumentParser parser = new(source, diagnostics);
        try
        {
            return parser.Document();
        }
        catch (YamlException exception)
        {
            SyntaxHint.Report(exception, source, diagnostics);
            return null;
        }
    }

    private DocumentNode? Document()
    {
        Next<StreamStart>();
        if (!Advance() || _events.Current is not DocumentStart)
        {
            _diagnostics.Error(_source.PositionAt(0), "the document is empty", "a model begins with 'model: its title'");
            return null;
        }

        Advance();
        DocumentNode? root = Node(depth: 0, inFlow: false);
        if (_stopped)
        {
            return null;
        }

        Next<DocumentEnd>();
        if (Advance() && _events.Current is DocumentStart second)
        {
            Stop(second, "a second document begins here", "one file holds one model: remove '---' or '...'");
            return null;
        }

        return root;
    }

    /// <summary>
    /// Moves to the next event. YamlDotNet's scanner answers some malformed texts with exceptions of other kinds
    /// (InvalidOperationException out of ScanPlainScalar, found by HostileDocumentTests); they mean the same: this is no YAML.
    /// </summary>
    private bool Advance()
    {
        Mark reached = _events.Current?.End ?? Mark.Empty;
        try
        {
            return _events.MoveNext();
        }
        catch (Exception exception) when (exception is not YamlException)
        {
            throw new YamlException(reached, reached, SyntaxHint.Malformed, exception);
        }
    }

    private void Next<T>()
        where T : ParsingEvent
    {
        if (_events.Current is not T)
        {
            Advance();
        }
    }

    /// <summary>Reads the node that the current event begins, and moves behind it.</summary>
    private DocumentNode? Node(int depth, bool inFlow)
    {
        ParsingEvent current = _events.Current!;
        if (++_nodes > ModelBounds.Nodes)
        {
            return Stop(
                current,
                $"the document has more than {ModelBounds.Nodes:N0} entries, those that aliases repeat included",
                null);
        }

        if (depth > ModelBounds.Nesting)
        {
            return Stop(current, $"mappings and lists lie more than {ModelBounds.Nesting} deep in each other", null);
        }

        if (current is NodeEvent { Tag.IsEmpty: false } tagged)
        {
            Error(
                tagged,
                $"tag {DiagnosticList.Quote(tagged.Tag.Value)} is not used in models",
                "remove it: values are read as they are written");
        }

        return current switch
        {
            AnchorAlias alias => Aliased(alias, depth),
            MappingStart mapping => Anchored(mapping, Mapping(mapping, depth)),
            SequenceStart sequence => Anchored(sequence, Sequence(sequence, depth)),
            Scalar scalar => Anchored(scalar, Text(scalar, inFlow)),
            _ => Stop(current, "YAML of an unexpected form", null),
        };
    }

    private DocumentNode? Aliased(AnchorAlias alias, int depth)
    {
        Advance();
        if (!_anchors.TryGetValue(alias.Value.Value, out DocumentNode? target))
        {
            return Stop(alias, $"no entry above is marked '&{alias.Value.Value}'", null);
        }

        _nodes += target.Size;
        return _nodes > ModelBounds.Nodes || depth + target.Height > ModelBounds.Nesting
            ? Stop(alias, "aliases blow the document up beyond its bounds", "write the entries out, or make them formulas")
            : target;
    }

    private DocumentNode? Anchored(NodeEvent start, DocumentNode? node)
    {
        if (node is not null && !start.Anchor.IsEmpty)
        {
            _anchors[start.Anchor.Value] = node;
        }

        return node;
    }

    private ScalarNode Text(Scalar scalar, bool inFlow)
    {
        Advance();
        ScalarNode node = new(_source, (int)scalar.Start.Index, (int)scalar.End.Index, scalar.Value, scalar.Style);
        if (inFlow && node.IsPlain && node.Text.Count(c => c == '(') > node.Text.Count(c => c == ')'))
        {
            Error(scalar, $"YAML cuts the call at its comma and leaves {DiagnosticList.Quote(node.Text)}", SyntaxHint.BlockStyle);
        }

        return node;
    }

    private SequenceNode? Sequence(SequenceStart start, int depth)
    {
        Advance();
        List<DocumentNode> items = [];
        while (!_stopped && _events.Current is not SequenceEnd)
        {
            if (Node(depth + 1, start.Style == SequenceStyle.Flow) is { } item)
            {
                items.Add(item);
            }
        }

        Advance();
        return _stopped ? null : new SequenceNode(_source.PositionAt((int)start.Start.Index), items);
    }

    private MappingNode? Mapping(MappingStart start, int depth)
    {
        Advance();
        bool inFlow = start.Style == MappingStyle.Flow;
        Dictionary<string, MappingEntry> entries = new(StringComparer.Ordinal);
        List<MappingEntry> ordered = [];
        bool lostEntries = false;
        while (!_stopped && _events.Current is not MappingEnd)
        {
            if (Entry(depth, inFlow) is { } entry && _check.IsWelcome(entry, inFlow, entries))
            {
                entries.Add(entry.Key.Text, entry);
                ordered.Add(entry);
            }
            else
            {
                lostEntries = true;
            }
        }

        Advance();
        return _stopped ? null : new MappingNode(
            _source.PositionAt((int)start.Start.Index),
            ordered)
        { LostEntries = lostEntries };
    }

    private MappingEntry? Entry(int depth, bool inFlow)
    {
        ParsingEvent start = _events.Current!;
        DocumentNode? key = Node(depth + 1, inFlow);
        DocumentNode? value = _stopped ? null : Node(depth + 1, inFlow);
        if (value is null)
        {
            return null;
        }

        if (key is ScalarNode text)
        {
            return new MappingEntry(text, value);
        }

        Error(start, "a key is a text, not a mapping or a list", SyntaxHint.BlockStyle);
        return null;
    }

    private void Error(ParsingEvent at, string message, string? hint) =>
        _diagnostics.Error(_source.PositionAt((int)at.Start.Index), message, hint);

    private DocumentNode? Stop(ParsingEvent at, string message, string? hint)
    {
        _stopped = true;
        Error(at, message, hint);
        return null;
    }
}
