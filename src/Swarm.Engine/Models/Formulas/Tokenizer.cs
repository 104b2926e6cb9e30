namespace Swarm.Engine.Models.Formulas;

/// <summary>Cuts a formula into tokens.</summary>
internal static class Tokenizer
{
    // Longer symbols first.
    private static readonly string[] Symbols =
        ["**", "&&", "||", "<=", ">=", "==", "!=", "<>", "+", "-", "*", "/", "^", "<", ">", "=", "(", ")", "[", "]", ",", "%", "!"];

    /// <summary>The token that begins at or behind an index.</summary>
    public static Token Next(string text, int at)
    {
        while (at < text.Length && char.IsWhiteSpace(text[at]))
        {
            at++;
        }

        if (at == text.Length)
        {
            return new Token(TokenKind.End, at, "");
        }

        int number = NumberText.LengthAt(text, at);
        if (number > 0)
        {
            return new Token(TokenKind.Number, at, text.Substring(at, number));
        }

        int name = NameText.LengthAt(text, at);
        if (name > 0)
        {
            return new Token(TokenKind.Name, at, text.Substring(at, name));
        }

        string? symbol = Array.Find(Symbols, s => string.CompareOrdinal(text, at, s, 0, s.Length) == 0);
        return symbol is null
            ? new Token(TokenKind.Bad, at, text.Substring(at, char.IsHighSurrogate(text[at]) && at + 1 < text.Length ? 2 : 1))
            : new Token(TokenKind.Symbol, at, symbol);
    }
}
