namespace Swarm.Engine.Models.Formulas;

/// <summary>A formula's first mistake: it leaves the parser's recursion and is told as a diagnostic, never seen outside.</summary>
/// <param name="offset">Index in the formula.</param>
/// <param name="message">What is wrong.</param>
/// <param name="hint">What would be right, or null.</param>
internal sealed class FormulaSyntaxException(int offset, string message, string? hint) : Exception(message)
{
    public int Offset => offset;

    public string? Hint => hint;
}
