using Swarm.Engine.Models.Documents;

namespace Swarm.Engine.Models.Formulas;

/// <summary>A distribution as it is written: <c>normal(mean=2%, sd=1.2%)</c>.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Position">Where the name begins.</param>
/// <param name="Arguments">What stands in the brackets.</param>
internal sealed record DistributionCall(string Name, SourcePosition Position, IReadOnlyList<CallArgument> Arguments)
{
    private const string Form = "a distribution is written name(parameter=value, ...), as in normal(mean=0, sd=1)";

    /// <summary>Parses a whole text as a call; null and a diagnostic if it is none.</summary>
    public static DistributionCall? Parse(ScalarNode source, DiagnosticList diagnostics)
    {
        try
        {
            FormulaParser parser = new(source);
            DistributionCall call = Read(parser);
            parser.ExpectEnd("a draw is one distribution, and arithmetic on it is a formula");
            return call;
        }
        catch (FormulaSyntaxException exception)
        {
            diagnostics.Error(source.PositionOf(exception.Offset), exception.Message, exception.Hint);
            return null;
        }
    }

    private static DistributionCall Read(FormulaParser parser)
    {
        Token name = parser.Take();
        if (name.Kind != TokenKind.Name || !parser.Token.Is("("))
        {
            throw new FormulaSyntaxException(
                name.Start,
                name.Kind == TokenKind.Name ? $"{name.Shown} is no distribution" : $"a distribution should stand here, not {name.Shown}",
                name.Kind == TokenKind.Name ? Form : $"{Form}; what is not random is a formula");
        }

        parser.Take();
        List<CallArgument> arguments = [];
        while (!parser.Token.Is(")"))
        {
            if (arguments.Count > 0)
            {
                parser.Expect(",");
            }

            arguments.Add(Argument(parser));
        }

        parser.Expect(")");
        return new DistributionCall(name.Text, parser.PositionOf(name), arguments);
    }

    private static CallArgument Argument(FormulaParser parser)
    {
        Token first = parser.Token;
        SourcePosition position = parser.PositionOf(first);
        if (!parser.IsNamedArgument)
        {
            return Value(parser, null, position);
        }

        parser.Take();
        parser.Expect("=");
        return Value(parser, first.Text, position);
    }

    private static CallArgument Value(FormulaParser parser, string? name, SourcePosition position)
    {
        if (!parser.Token.Is("["))
        {
            return new CallArgument(name, position, IsList: false, [parser.Expression()]);
        }

        parser.Take();
        List<Expression> items = [parser.Expression()];
        while (parser.Token.Is(",") && items.Count < ModelBounds.ListLength)
        {
            parser.Take();
            items.Add(parser.Expression());
        }

        parser.Expect("]");
        return new CallArgument(name, position, IsList: true, items);
    }
}

/// <summary>An argument of a distribution.</summary>
/// <param name="Name">The parameter's name, or null where it was left out.</param>
/// <param name="Position">Where the argument begins.</param>
/// <param name="IsList">True for <c>[a, b]</c>.</param>
/// <param name="Values">The values.</param>
internal sealed record CallArgument(string? Name, SourcePosition Position, bool IsList, IReadOnlyList<Expression> Values);
