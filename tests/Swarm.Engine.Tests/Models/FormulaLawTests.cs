using CsCheck;
using Swarm.Engine.Models;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Tests.Models;

public class FormulaLawTests
{
    private static readonly SourcePosition Nowhere = new("model.yaml", 1, 1);

    private static readonly Gen<Expression> Leaf = Gen.OneOf<Expression>(
        Gen.Int[0, 999].Select(n => (Expression)new NumberExpression(n / 8.0, Nowhere)),
        Gen.Select(Gen.OneOf(
            Gen.Const("a"),
            Gen.Const("b_1"),
            Gen.Const("motor.unpaid.2021Q1")), Gen.Enum<StepIndex>(), Gen.Int[0, 99])
            .Select((name, index, step) => (Expression)new ReferenceExpression(
                name,
                index,
                index == StepIndex.Fixed ? step : 0,
                Nowhere)));

    private static readonly Gen<Expression> Any = Gen.Recursive<Expression>((depth, inner) => depth == 5
        ? Leaf
        : Gen.OneOf(
            Leaf,
            Gen.Select(Gen.Enum<UnaryOperator>(), inner).Select((o, x) => (Expression)new UnaryExpression(o, x, Nowhere)),
            Gen.Select(Gen.Enum<BinaryOperator>(), inner, inner).Select((o, x, y) => (Expression)new BinaryExpression(o, x, y, Nowhere)),
            Gen.Select(inner, inner, inner).Select((x, y, z) => (Expression)new CallExpression(Function.If, [x, y, z], Nowhere)),
            Gen.Select(Gen.OneOf(Gen.Const(Function.Min), Gen.Const(Function.Max)), inner.Array[2, 4]).Select((f, xs) => (Expression)new CallExpression(f, xs, Nowhere)),
            Gen.Select(Gen.Enum<StepReduction>(), inner).Select((r, x) => (Expression)new OverStepsExpression(r, x, Nowhere))));

    [Fact]
    public void A_printed_formula_is_read_back() =>
        Any.Sample(expression => Prefix.Of(Parsed(Printed.Of(expression))!) == Prefix.Of(expression), iter: 3_000, seed: "0N0XIzNsQ0O2");

    [Fact]
    public void No_text_breaks_the_parser() =>
        Gen.Char["abt019.%_()[],+-*/^<>=!&| \n#\u2264\u00e9"].Array[0, 40].Select(chars => new string(chars)).Sample(
            text =>
            {
                DiagnosticList diagnostics = new();
                return (FormulaParser.Parse(Node(text), diagnostics) is null) == diagnostics.HasErrors;
            },
            iter: 20_000,
            seed: "0N0XIzNsQ0O2");

    private static Expression? Parsed(string text) => FormulaParser.Parse(Node(text), new DiagnosticList());

    private static ScalarNode Node(string text) =>
        new(new SourceText("model.yaml", text), 0, text.Length, text, YamlDotNet.Core.ScalarStyle.Plain);
}
