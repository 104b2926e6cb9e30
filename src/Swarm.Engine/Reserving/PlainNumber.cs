using System.Globalization;
using System.Text.RegularExpressions;

namespace Swarm.Engine.Reserving;

/// <summary>Amounts as they may be written: digits with a decimal point, an exponent, and _ between digits.</summary>
internal static partial class PlainNumber
{
    private const double Largest = 1e15;

    /// <summary>The number, or NaN with what is wrong and what would be right.</summary>
    public static double Parse(string text, out string? message, out string hint)
    {
        message = null;
        hint = "give a plain number such as 1234.5, -20 or 1_234";
        if (!Form().IsMatch(text))
        {
            message = Complaint(text, ref hint);
            return double.NaN;
        }

        double value = double.Parse(text.Replace("_", "", StringComparison.Ordinal), NumberStyles.Float, CultureInfo.InvariantCulture);
        if (Math.Abs(value) <= Largest)
        {
            return value;
        }

        message = $"the amount {TriangleFaults.Quote(text)} is beyond {Largest:0e+0}";
        hint = "give the amounts in a larger unit, such as thousands";
        return double.NaN;
    }

    private static string Complaint(string text, ref string hint)
    {
        if (text.Length == 0)
        {
            hint = "give the amount (0 if there was none), or leave the row out";
            return "the amount is missing";
        }

        string quoted = TriangleFaults.Quote(text);
        if (text.ToUpperInvariant().Trim('+', '-') is "NAN" or "INF" or "INFINITY" or "\u221E")
        {
            return $"the amount {quoted} is not finite";
        }

        if (text[0] == '(' && text[^1] == ')')
        {
            hint = "write a negative amount with a minus";
        }
        else if (Grouped().IsMatch(text))
        {
            hint = "write thousands without separators or with _, and decimals with a point: 1234.5 or 1_234.5";
        }

        return $"the amount {quoted} is not a number";
    }

    [GeneratedRegex(@"^[+-]?([0-9]+(_[0-9]+)*(\.[0-9]*)?|\.[0-9]+)([eE][+-]?[0-9]{1,4})?$", RegexOptions.CultureInvariant)]
    private static partial Regex Form();

    [GeneratedRegex(@"^[+-]?[0-9][0-9.,'\u2019 \u00A0\u202F]*$", RegexOptions.CultureInvariant)]
    private static partial Regex Grouped();
}
