namespace Swarm.Engine.Models;

/// <summary>Errors and warnings as they are found; the first of each are kept, and the end says that there were more.</summary>
internal sealed class DiagnosticList
{
    private const int QuotedLength = 60;

    private readonly List<Diagnostic> _kept = [];
    private readonly int[] _counts = new int[2];

    /// <summary>True once an error was found.</summary>
    public bool HasErrors => _counts[(int)Severity.Error] > 0;

    /// <summary>True once no further error will be told, so that looking for more is wasted.</summary>
    public bool IsFull => _counts[(int)Severity.Error] > ModelBounds.Diagnostics;

    public void Error(SourcePosition position, string message, string? hint = null) =>
        Add(new Diagnostic(Severity.Error, position, message, hint));

    public void Warning(SourcePosition position, string message, string? hint = null) =>
        Add(new Diagnostic(Severity.Warning, position, message, hint));

    public void Add(Diagnostic diagnostic)
    {
        ref int count = ref _counts[(int)diagnostic.Severity];
        count++;
        if (count <= ModelBounds.Diagnostics)
        {
            _kept.Add(diagnostic);
        }
    }

    /// <summary>What was kept, by place: the model's file first, then each data file in the order of its first mention.</summary>
    public IReadOnlyList<Diagnostic> InOrder(string modelFile)
    {
        List<string> files = [modelFile, .. _kept.Select(d => d.Position.File ?? modelFile).Distinct().Where(f => f != modelFile)];
        List<Diagnostic> ordered =
        [
            .. _kept.OrderBy(d => files.IndexOf(d.Position.File ?? modelFile)).ThenBy(d => d.Position.Line).ThenBy(d => d.Position.Column),
        ];
        if (_counts.Any(count => count > ModelBounds.Diagnostics))
        {
            SourcePosition last = ordered[^1].Position;
            Severity severity = HasErrors ? Severity.Error : Severity.Warning;
            ordered.Add(new Diagnostic(
                severity,
                last,
                $"there is more: only the first {ModelBounds.Diagnostics} errors and warnings are told",
                "mend these and check again"));
        }

        return ordered;
    }

    /// <summary>A piece of the user's text for a message: clipped, on one line, in quotes.</summary>
    public static string Quote(string text)
    {
        string clipped = text.Length <= QuotedLength ? text : string.Concat(text.AsSpan(0, QuotedLength - 3), "...");
        return $"'{new string([.. clipped.Select(c => char.IsControl(c) || char.IsSurrogate(c) ? ' ' : c)])}'";
    }
}
