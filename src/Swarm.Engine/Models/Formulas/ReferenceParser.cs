using System.Globalization;

namespace Swarm.Engine.Models.Formulas;

/// <summary>Parses the index behind a name: <c>[t]</c>, <c>[t-1]</c>, <c>[3]</c>, <c>[horizon]</c>, or none.</summary>
internal static class ReferenceParser
{
    private const string Forms = "an index is [t], [t-1], a step like [3], or [horizon]";

    public static ReferenceExpression Parse(FormulaParser parser, Token name)
    {
        SourcePosition position = parser.PositionOf(name);
        if (!parser.Token.Is("["))
        {
            return new ReferenceExpression(name.Text, StepIndex.None, 0, position);
        }

        parser.Take();
        Token first = parser.Take();
        (StepIndex index, int step) = first switch
        {
            { Kind: TokenKind.Number } => (StepIndex.Fixed, Step(first)),
            { Text: "horizon" } => (StepIndex.Horizon, 0),
            { Text: "t" } => (Offset(parser), 0),
            _ => throw new FormulaSyntaxException(first.Start, $"{first.Shown} is no index", Forms),
        };
        parser.Expect("]");
        return new ReferenceExpression(name.Text, index, step, position);
    }

    private static StepIndex Offset(FormulaParser parser)
    {
        if (parser.Token.Is("]"))
        {
            return StepIndex.Current;
        }

        Token sign = parser.Take();
        Token count = parser.Token;
        if (sign.Is("-") && count is { Kind: TokenKind.Number, Text: "1" })
        {
            parser.Take();
            return StepIndex.Previous;
        }

        throw new FormulaSyntaxException(sign.Start, "a formula looks back one step at most", sign.Is("+")
            ? "turn the formula round, so that the later step looks back with [t-1]"
            : "carry the older value along in a formula of its own: last[t]: x[t-1]");
    }

    private static int Step(Token token) =>
        int.TryParse(token.Text, NumberStyles.None, CultureInfo.InvariantCulture, out int step)
            ? step
            : throw new FormulaSyntaxException(token.Start, $"{token.Shown} is no step", Forms);
}
