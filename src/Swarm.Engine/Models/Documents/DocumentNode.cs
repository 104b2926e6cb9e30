namespace Swarm.Engine.Models.Documents;

/// <summary>A node of a document: text, mapping or list, with its place.</summary>
/// <param name="position">Where it begins.</param>
internal abstract class DocumentNode(SourcePosition position)
{
    public SourcePosition Position { get; } = position;

    /// <summary>Number of nodes from here down, those that aliases repeat counted each time.</summary>
    public abstract int Size { get; }

    /// <summary>Mappings and lists on the longest way down, this one included.</summary>
    public abstract int Height { get; }

    /// <summary>What it is, for messages.</summary>
    public abstract string Kind { get; }
}

/// <summary>An entry of a mapping.</summary>
internal sealed record MappingEntry(ScalarNode Key, DocumentNode Value);

/// <summary>A mapping, its entries in the order of the document.</summary>
internal sealed class MappingNode : DocumentNode
{
    private readonly Dictionary<string, MappingEntry> _byKey;

    public MappingNode(SourcePosition position, IReadOnlyList<MappingEntry> entries)
        : base(position)
    {
        Entries = entries;
        _byKey = entries.ToDictionary(entry => entry.Key.Text, StringComparer.Ordinal);
        Size = 1 + entries.Sum(entry => 1 + entry.Value.Size);
        Height = 1 + entries.Select(entry => entry.Value.Height).DefaultIfEmpty().Max();
    }

    public IReadOnlyList<MappingEntry> Entries { get; }

    /// <summary>True if entries were refused and left out.</summary>
    public bool LostEntries { get; init; }

    public override int Size { get; }

    public override int Height { get; }

    public override string Kind => "a mapping";

    /// <summary>The value of a key, or null.</summary>
    public DocumentNode? this[string key] => _byKey.GetValueOrDefault(key)?.Value;

    /// <summary>The entry of a key, or null.</summary>
    public MappingEntry? Entry(string key) => _byKey.GetValueOrDefault(key);
}

/// <summary>A list.</summary>
internal sealed class SequenceNode(SourcePosition position, IReadOnlyList<DocumentNode> items) : DocumentNode(position)
{
    public IReadOnlyList<DocumentNode> Items { get; } = items;

    public override int Size { get; } = 1 + items.Sum(item => item.Size);

    public override int Height { get; } = 1 + items.Select(item => item.Height).DefaultIfEmpty().Max();

    public override string Kind => "a list";
}
