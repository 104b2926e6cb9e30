namespace Swarm.Engine.Models.Formulas;

/// <summary>
/// Names of quantities: parts joined by dots, of letters, digits and underscores; the first part begins with a letter or an
/// underscore, later ones may begin with a digit, as in <c>motor.unpaid.2021Q1</c>.
/// </summary>
internal static class NameText
{
    /// <summary>The pattern of a name, as the JSON schema states it, without anchors.</summary>
    public const string Pattern = @"[\p{L}_][\p{L}\p{Nd}_]*(\.[\p{L}\p{Nd}_]+)*";

    /// <summary>Words that mean something in formulas, as alternatives of a regular expression.</summary>
    public const string ReservedWords =
        "t|horizon|and|or|not|true|false|if|min|max|abs|exp|log|sqrt|floor|clamp|sum|mean|any|all|largest|smallest";

    private static readonly HashSet<string> Reserved = new(ReservedWords.Split('|'), StringComparer.Ordinal);

    /// <summary>True if a quantity may not be called so: the word means something in formulas.</summary>
    public static bool IsReserved(string name) => Reserved.Contains(name);

    /// <summary>Characters of the name that begins at an index; 0 if none does.</summary>
    public static int LengthAt(string text, int start)
    {
        if (start >= text.Length || !(char.IsLetter(text[start]) || text[start] == '_'))
        {
            return 0;
        }

        int at = SkipPart(text, start);
        while (at + 1 < text.Length && text[at] == '.' && IsPart(text[at + 1]))
        {
            at = SkipPart(text, at + 1);
        }

        return at - start;
    }

    /// <summary>True if the whole text is a name.</summary>
    public static bool IsName(string text) => text.Length > 0 && LengthAt(text, 0) == text.Length;

    private static int SkipPart(string text, int at)
    {
        while (at < text.Length && IsPart(text[at]))
        {
            at++;
        }

        return at;
    }

    private static bool IsPart(char c) => char.IsLetter(c) || char.IsDigit(c) || c == '_';
}
