namespace Swarm.Engine.Models.Documents;

/// <summary>Refuses entries of mappings that YAML allows and models do not: they are mistakes more often than intentions.</summary>
/// <param name="diagnostics">Where they are told.</param>
internal sealed class EntryCheck(DiagnosticList diagnostics)
{
    /// <summary>True if the entry may be added to those of its mapping.</summary>
    public bool IsWelcome(MappingEntry entry, bool inFlow, Dictionary<string, MappingEntry> entries)
    {
        string key = entry.Key.Text;
        if (entry.Key.IsPlain && key == "<<")
        {
            diagnostics.Error(entry.Key.Position, "merge keys are not used in models", "write the entries out");
            return false;
        }

        if (entries.TryGetValue(key, out MappingEntry? first))
        {
            diagnostics.Error(
                entry.Key.Position, $"{DiagnosticList.Quote(key)} stands here twice, first in line {first.Key.Position.Line}", "keep one of them");
            return false;
        }

        bool isCut = inFlow && (IsCutCall(key) || entry.Value is ScalarNode { IsPlain: true } value && IsCutCall(value.Text));
        if (inFlow && !isCut && entry.Value is ScalarNode { IsNothing: true })
        {
            diagnostics.Error(
                entry.Key.Position,
                $"{DiagnosticList.Quote(key)} has no value",
                key.Contains(':') ? "leave a space behind the colon" : SyntaxHint.BlockStyle);
            return false;
        }

        return !isCut;
    }

    /// <summary>True for a piece of a call that flow style has cut at its comma.</summary>
    private static bool IsCutCall(string text) => text.Count(c => c == '(') != text.Count(c => c == ')');
}
