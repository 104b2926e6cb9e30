using System.Globalization;

namespace Swarm.Engine.Models.Formulas;

/// <summary>Numbers as models write them: <c>1_000_000</c>, <c>7.5%</c>, <c>1e6</c>, <c>.5</c>.</summary>
internal static class NumberText
{
    /// <summary>The pattern of a signed number, as the JSON schema states it.</summary>
    public const string Pattern = @"^[-+]?([0-9]+(_[0-9]+)*(\.[0-9]+(_[0-9]+)*)?|\.[0-9]+(_[0-9]+)*)([eE][-+]?[0-9]{1,4})?%?$";

    /// <summary>Reads a whole text as a number with an optional sign; false if it is none or none that is finite.</summary>
    public static bool TryRead(string text, out double value)
    {
        int start = text.Length > 0 && text[0] is '-' or '+' ? 1 : 0;
        int length = LengthAt(text, start);
        value = 0;
        if (length == 0 || start + length != text.Length || !TryValue(text.AsSpan(start, length), out value))
        {
            return false;
        }

        value = text[0] == '-' ? -value : value;
        return true;
    }

    /// <summary>Characters of the unsigned number that begins at an index; 0 if none does.</summary>
    public static int LengthAt(string text, int start)
    {
        int at = SkipDigits(text, start);
        if (at < text.Length && text[at] == '.')
        {
            int fraction = SkipDigits(text, at + 1);
            at = fraction > at + 1 ? fraction : at;
        }

        if (at == start)
        {
            return 0;
        }

        at = SkipExponent(text, at);
        return (at < text.Length && text[at] == '%' ? at + 1 : at) - start;
    }

    /// <summary>
    /// Value of a well-formed unsigned number. A percent sign moves the decimal exponent before the one conversion, so 99.9% and
    /// 0.999 are the same number to the bit; dividing by 100 afterwards would round twice.
    /// </summary>
    /// <returns>False if it overflows, or is not zero and underflows to it.</returns>
    public static bool TryValue(ReadOnlySpan<char> text, out double value)
    {
        bool isPercent = text[^1] == '%';
        string plain = (isPercent ? text[..^1] : text).ToString().Replace("_", "", StringComparison.Ordinal);
        if (isPercent)
        {
            int mark = plain.IndexOfAny(['e', 'E']);
            int exponent = mark < 0 ? 0 : int.Parse(plain.AsSpan(mark + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
            plain = string.Create(CultureInfo.InvariantCulture, $"{(mark < 0 ? plain : plain[..mark])}e{exponent - 2}");
        }

        value = double.Parse(plain, NumberStyles.Float, CultureInfo.InvariantCulture);
        bool isLost = value == 0 && plain.AsSpan(0, Mantissa(plain)).IndexOfAnyInRange('1', '9') >= 0;
        return double.IsFinite(value) && !isLost;
    }

    private static int Mantissa(string plain)
    {
        int mark = plain.IndexOfAny(['e', 'E']);
        return mark < 0 ? plain.Length : mark;
    }

    private static int SkipDigits(string text, int at)
    {
        int start = at;
        while (at < text.Length && (char.IsAsciiDigit(text[at]) || IsSeparator(text, start, at)))
        {
            at++;
        }

        return at;
    }

    private static bool IsSeparator(string text, int start, int at) =>
        text[at] == '_' && at > start && text[at - 1] != '_' && at + 1 < text.Length && char.IsAsciiDigit(text[at + 1]);

    private static int SkipExponent(string text, int at)
    {
        const int MaxDigits = 4;
        if (at >= text.Length || text[at] is not ('e' or 'E'))
        {
            return at;
        }

        int digits = at + 1 < text.Length && text[at + 1] is '-' or '+' ? at + 2 : at + 1;
        int end = digits;
        while (end < text.Length && char.IsAsciiDigit(text[end]) && end - digits < MaxDigits)
        {
            end++;
        }

        return end == digits ? at : end;
    }
}
