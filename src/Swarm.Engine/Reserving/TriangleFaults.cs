using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>Errors and warnings of one file as they are found.</summary>
internal sealed class TriangleFaults(string file)
{
    private const int Kept = 50;
    private const int QuotedLength = 40;

    private readonly List<Diagnostic> _all = [];

    public bool HasErrors => _all.Exists(d => d.Severity == Severity.Error);

    /// <summary>True once a cell could not be placed, so that a gap may be no gap of the data.</summary>
    public bool HasLostCells { get; set; }

    public SourcePosition At(int line, int column) => new(file, line, column);

    public void Error(SourcePosition position, string message, string hint) =>
        _all.Add(new Diagnostic(Severity.Error, position, message, hint));

    public void Warning(SourcePosition position, string message, string hint) =>
        _all.Add(new Diagnostic(Severity.Warning, position, message, hint));

    /// <summary>In the order of the file; of very many the first, and how many more there are.</summary>
    public IReadOnlyList<Diagnostic> InOrder()
    {
        Diagnostic[] ordered = [.. _all.OrderBy(d => d.Position.Line).ThenBy(d => d.Position.Column)];
        return ordered.Length <= Kept
            ? ordered
            :
            [
                .. ordered.Take(Kept),
                ordered[Kept] with
                {
                    Message = $"there are {ordered.Length - Kept} more errors and warnings from here on",
                    Hint = "mend these and check again",
                },
            ];
    }

    /// <summary>The user's text in quotes, clipped and on one line.</summary>
    public static string Quote(string text)
    {
        string clipped = text.Length <= QuotedLength ? text : string.Concat(text.AsSpan(0, QuotedLength), "...");
        return $"'{new string([.. clipped.Select(c => char.IsControl(c) ? ' ' : c)])}'";
    }
}
