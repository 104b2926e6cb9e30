using System.Globalization;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Shapes;

/// <summary>Checks that a text is a number and lies in its range.</summary>
internal static class NumberCheck
{
    public static void Check(ScalarNode scalar, NumberShape shape, string place, DiagnosticList diagnostics)
    {
        if (!NumberText.TryRead(scalar.Text, out double value))
        {
            diagnostics.Error(
                scalar.Position,
                $"{place} is {DiagnosticList.Quote(scalar.Text)}, which is no number",
                HintFor(scalar.Text));
        }
        else if (shape.IsWhole && value != Math.Floor(value))
        {
            diagnostics.Error(scalar.Position, $"{place} is {scalar.Text}, which is not whole", "write a whole number");
        }
        else if (!IsInRange(value, shape))
        {
            diagnostics.Error(
                scalar.Position,
                $"{place} is {scalar.Text}",
                $"it must be {Range(shape)}{PercentHint(value, shape)}");
        }
    }

    private static bool IsInRange(double value, NumberShape shape) =>
        !(value < shape.Least || value <= shape.Above || value > shape.Most || value >= shape.Below);

    private static string Range(NumberShape shape)
    {
        List<string> parts = [];
        Add(parts, "at least", shape.Least);
        Add(parts, "above", shape.Above);
        Add(parts, "at most", shape.Most);
        Add(parts, "below", shape.Below);
        return string.Join(" and ", parts);
    }

    private static void Add(List<string> parts, string word, double? bound)
    {
        if (bound is double value)
        {
            parts.Add($"{word} {value.ToString(CultureInfo.InvariantCulture)}");
        }
    }

    private static string PercentHint(double value, NumberShape shape)
    {
        const double Hundred = 100;
        bool looksLikePercent = value >= 1 && value < Hundred && (shape.Below == 1 || shape.Most == 1);
        return looksLikePercent ? string.Create(CultureInfo.InvariantCulture, $"; did you mean {value}%?") : "";
    }

    private static string HintFor(string text)
    {
        if (text.Contains(',', StringComparison.Ordinal))
        {
            return "a decimal point is '.', thousands are parted by '_', as in 1_000.5";
        }

        return text.Contains('(', StringComparison.Ordinal) || text.IndexOfAny(['+', '*', '/']) > 0
            ? "a number stands here, not a formula"
            : "write it as 1_000, 0.25, 25% or 1e6";
    }
}
