namespace Swarm.Engine.Models.Formulas;

/// <summary>Kinds of tokens.</summary>
internal enum TokenKind
{
    Number,
    Name,
    Symbol,
    End,
    Bad,
}

/// <summary>A token of a formula.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Start">Its first character's index in the formula.</param>
/// <param name="Text">Its characters.</param>
internal readonly record struct Token(TokenKind Kind, int Start, string Text)
{
    public int End => Start + Text.Length;

    public bool Is(string text) => Kind is TokenKind.Symbol or TokenKind.Name && Text == text;

    /// <summary>The token for a message.</summary>
    public string Shown => Kind == TokenKind.End ? "the end" : DiagnosticList.Quote(Text);
}
