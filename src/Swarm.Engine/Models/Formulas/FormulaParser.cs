using Swarm.Engine.Models.Documents;
using Strength = Swarm.Engine.Models.Formulas.FormulaWords.Strength;

namespace Swarm.Engine.Models.Formulas;

/// <summary>
/// Parses a formula by operator precedence (Pratt 1973). Written by hand rather than on a parser library: places stay exact
/// through YAML's quoting and folding, and depth is bounded while parsing, not after.
/// </summary>
internal sealed class FormulaParser
{
    private readonly ScalarNode _source;
    private Token _token;
    private int _depth;

    public FormulaParser(ScalarNode source)
    {
        _source = source;
        if (source.Text.Length > ModelBounds.FormulaLength)
        {
            throw new FormulaSyntaxException(
                0,
                $"the formula is longer than {ModelBounds.FormulaLength:N0} characters",
                "split it into several");
        }

        _token = Tokenizer.Next(source.Text, 0);
    }

    /// <summary>The token to be read next.</summary>
    public Token Token => _token;

    /// <summary>True if the next two tokens are a name and <c>=</c>.</summary>
    public bool IsNamedArgument => _token.Kind == TokenKind.Name && Tokenizer.Next(_source.Text, _token.End).Is("=");

    /// <summary>Parses a whole formula; null and a diagnostic if it is none.</summary>
    public static Expression? Parse(ScalarNode source, DiagnosticList diagnostics)
    {
        try
        {
            FormulaParser parser = new(source);
            Expression expression = parser.Expression();
            parser.ExpectEnd("the formula should end here or go on with an operator");
            return expression;
        }
        catch (FormulaSyntaxException exception)
        {
            diagnostics.Error(source.PositionOf(exception.Offset), exception.Message, exception.Hint);
            return null;
        }
    }

    /// <summary>Parses an expression up to what cannot belong to it.</summary>
    public Expression Expression() => Operation(Strength.Or).Expression;

    public void ExpectEnd(string expectation)
    {
        if (_token.Kind != TokenKind.End)
        {
            throw Unexpected(expectation);
        }
    }

    /// <summary>Takes the next token, which must be the given one.</summary>
    public Token Expect(string text)
    {
        if (!_token.Is(text))
        {
            throw Unexpected($"'{text}' is missing");
        }

        return Take();
    }

    public Token Take()
    {
        Token taken = _token;
        _token = Tokenizer.Next(_source.Text, taken.End);
        return taken;
    }

    public FormulaSyntaxException Unexpected(string expectation) =>
        _token.Kind == TokenKind.End
            ? new(_token.Start, $"the text ends too early: {expectation}", null)
            : new(_token.Start, $"{_token.Shown} is out of place: {expectation}", FormulaWords.HintFor(_token.Text));

    public SourcePosition PositionOf(Token token) => _source.PositionOf(token.Start);

    private Parsed Operation(int least)
    {
        Parsed left = Operand(least);
        while (FormulaWords.Operators.TryGetValue(_token.Text, out (BinaryOperator Operator, int Strength) found)
            && found.Strength >= least)
        {
            Token symbol = Take();
            bool isRightAssociative = found.Strength == Strength.Power;
            Parsed right = isRightAssociative ? Deeper(() => Operation(found.Strength)) : Operation(found.Strength + 1);
            left = Join(symbol, new BinaryExpression(
                found.Operator,
                left.Expression,
                right.Expression,
                left.Expression.Position), left, right);
            if (found.Strength == Strength.Comparison)
            {
                RefuseChain(symbol);
            }
        }

        return left;
    }

    private void RefuseChain(Token first)
    {
        bool isChained = FormulaWords.Operators.TryGetValue(_token.Text, out (BinaryOperator, int Strength) next)
            && next.Strength == Strength.Comparison;
        if (isChained)
        {
            throw new FormulaSyntaxException(
                _token.Start, "comparisons cannot be chained", $"write a {first.Text} b and b {_token.Text} c");
        }
    }

    private Parsed Operand(int least)
    {
        switch (_token.Kind)
        {
            case TokenKind.Number:
                return new Parsed(Number(), 1);
            case TokenKind.Name when _token.Text == "not":
                return Not(least);
            case TokenKind.Name:
                return NameOrCall();
            case TokenKind.Symbol when _token.Text is "-" or "+":
                return Signed();
            case TokenKind.Symbol when _token.Text == "(":
                return Deeper(() =>
                {
                    Take();
                    Parsed inner = Operation(Strength.Or);
                    Expect(")");
                    return inner;
                });
            default:
                throw Unexpected("a number, a name or '(' should stand here");
        }
    }

    private NumberExpression Number()
    {
        Token token = Take();
        if (!NumberText.TryValue(token.Text, out double value))
        {
            throw new FormulaSyntaxException(token.Start, $"{token.Shown} is too large or too small for a number", null);
        }

        bool isGlued = _token.Start == token.End && _token.Kind is TokenKind.Name or TokenKind.Number;
        return isGlued
            ? throw new FormulaSyntaxException(
                token.Start,
                $"{DiagnosticList.Quote(token.Text + _token.Text)} is neither a number nor a name",
                "a name begins with a letter")
            : new NumberExpression(value, PositionOf(token));
    }

    private Parsed Signed() => Deeper(() =>
    {
        Token sign = Take();
        Parsed operand = Operation(Strength.Negation);
        return sign.Text == "-"
            ? Grown(sign, new UnaryExpression(UnaryOperator.Negate, operand.Expression, PositionOf(sign)), operand.Height)
            : operand;
    });

    private Parsed Not(int least)
    {
        if (least > Strength.Not)
        {
            throw new FormulaSyntaxException(
                _token.Start,
                "'not' inside a sum or comparison is hard to read",
                "put it in brackets: (not a)");
        }

        return Deeper(() =>
        {
            Token word = Take();
            Parsed operand = Operation(Strength.Not);
            return Grown(word, new UnaryExpression(UnaryOperator.Not, operand.Expression, PositionOf(word)), operand.Height);
        });
    }

    private Parsed NameOrCall()
    {
        Token name = Take();
        if (_token.Is("("))
        {
            return Deeper(() => Call(name));
        }

        if (NameText.IsReserved(name.Text))
        {
            throw new FormulaSyntaxException(name.Start, $"{name.Shown} cannot stand alone", ReservedHint(name.Text));
        }

        return new Parsed(ReferenceParser.Parse(this, name), 1);
    }

    private static string ReservedHint(string word) => word switch
    {
        "true" => "write 1",
        "false" => "write 0",
        "t" => "a counter of steps is a formula: n[0]: 0 and n[t]: n[t-1] + 1",
        "horizon" => "the last step is written as an index: x[horizon]",
        "and" or "or" => "it stands between two comparisons",
        _ when FormulaWords.Functions.TryGetValue(word, out (Function, int, int, string Form) function) => $"write {function.Form}",
        _ => $"write {word}(x[t])",
    };

    private Parsed Call(Token name)
    {
        Token open = Take();
        List<Parsed> arguments = [];
        if (!_token.Is(")"))
        {
            arguments.Add(Operation(Strength.Or));
            while (_token.Is(","))
            {
                Take();
                arguments.Add(Operation(Strength.Or));
            }
        }

        Expect(")");
        return Grown(
            open,
            FormulaCall.Of(name, [.. arguments.Select(a => a.Expression)], PositionOf(name)),
            arguments.Select(a => a.Height).DefaultIfEmpty().Max());
    }

    private Parsed Deeper(Func<Parsed> read)
    {
        if (++_depth > ModelBounds.FormulaNesting)
        {
            throw new FormulaSyntaxException(
                _token.Start,
                $"brackets and signs lie more than {ModelBounds.FormulaNesting} deep",
                "split the formula");
        }

        Parsed result = read();
        _depth--;
        return result;
    }

    private static Parsed Join(Token symbol, Expression expression, Parsed left, Parsed right) =>
        Grown(symbol, expression, Math.Max(left.Height, right.Height));

    private static Parsed Grown(Token at, Expression expression, int height) =>
        height < ModelBounds.FormulaHeight
            ? new Parsed(expression, height + 1)
            : throw new FormulaSyntaxException(
                at.Start,
                $"more than {ModelBounds.FormulaHeight:N0} operations follow from each other",
                "split the formula");

    /// <summary>An expression and the height of its tree.</summary>
    private readonly record struct Parsed(Expression Expression, int Height);
}
