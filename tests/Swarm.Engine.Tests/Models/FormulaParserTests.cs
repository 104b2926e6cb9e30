using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Tests.Models;

public class FormulaParserTests
{
    [Theory]
    [InlineData("1 + 2 * 3", "(Add 1 (Multiply 2 3))")]
    [InlineData("1 - 2 - 3", "(Subtract (Subtract 1 2) 3)")]
    [InlineData("8 / 4 * 2", "(Multiply (Divide 8 4) 2)")]
    [InlineData("2 ^ 3 ^ 2", "(Power 2 (Power 3 2))")]
    [InlineData("-2 ^ 2", "(Negate (Power 2 2))")]
    [InlineData("2 ^ -1 * 3", "(Multiply (Power 2 (Negate 1)) 3)")]
    [InlineData("-a * b", "(Multiply (Negate a) b)")]
    [InlineData("a - -b", "(Subtract a (Negate b))")]
    [InlineData("+a", "a")]
    [InlineData("a + 1 < b * 2", "(Less (Add a 1) (Multiply b 2))")]
    [InlineData("not a < b and c or d", "(Or (And (Not (Less a b)) c) d)")]
    [InlineData("a or b and c", "(Or a (And b c))")]
    [InlineData("(a or b) and c", "(And (Or a b) c)")]
    [InlineData("a == 1 and b != 2", "(And (Equal a 1) (NotEqual b 2))")]
    [InlineData("if(a >= 0, a, -a)", "(If (GreaterOrEqual a 0) a (Negate a))")]
    [InlineData("max(0, min(a, b, c) - 3)", "(Max 0 (Subtract (Min a b c) 3))")]
    [InlineData("clamp(floor(a), abs(b), sqrt(exp(log(c))))", "(Clamp (Floor a) (Abs b) (Sqrt (Exp (Log c))))")]
    [InlineData("sum(x[t] * y)", "(Sum (Multiply x[t] y))")]
    [InlineData("x[t-1] + x[ t - 1 ] + x[3] + x[horizon]", "(Add (Add (Add x[t-1] x[t-1]) x[3]) x[horizon])")]
    [InlineData("motor.unpaid.2021Q1 + motor.paid.2026", "(Add motor.unpaid.2021Q1 motor.paid.2026)")]
    [InlineData("7.5% * 1_000_000", "(Multiply 0.075 1000000)")]
    [InlineData("1e6 + .5 + 2.5E-3", "(Add (Add 1000000 0.5) 0.0025)")]
    public void Operators_bind_as_in_arithmetic(string formula, string expected) => Assert.Equal(expected, Prefix.Of(BodyOf(formula)));

    [Fact]
    public void Every_part_knows_where_it_begins()
    {
        BinaryExpression body = Assert.IsType<BinaryExpression>(BodyOf("max(a, 1) + foo.bar[t-1]"));

        Assert.Equal((6, 10), At(body));
        CallExpression call = Assert.IsType<CallExpression>(body.Left);
        Assert.Equal((6, 14), At(call.Arguments[0]));
        Assert.Equal((6, 17), At(call.Arguments[1]));
        Assert.Equal((6, 22), At(body.Right));
    }

    [Theory]
    [InlineData("x: 'a +  )'", 6, 12)]
    [InlineData("x: \"a +  )\"", 6, 12)]
    [InlineData("x: a\n    +\n    b )", 8, 7)]
    [InlineData("x: >\n    a +\n    b )", 8, 7)]
    [InlineData("x: |\n    a +\n    b )", 8, 7)]
    [InlineData("x: >-\n\n    a +\n\n    )", 10, 5)]
    [InlineData("x: \"a +\n    b )\"", 7, 7)]
    public void An_error_is_told_at_its_place_inside_quotes_and_folds(string entry, int line, int column)
    {
        Diagnostic diagnostic = Documents.Read(Document(entry)).Diagnostics[0];

        Assert.Equal(new SourcePosition("model.yaml", line, column), diagnostic.Position);
    }

    [Fact]
    public void Brackets_are_bounded_and_not_by_the_stack()
    {
        string right = new string('(', 200) + "a" + new string(')', 200);
        string deep = new string('(', 4_000) + "a" + new string(')', 4_000);

        Assert.Equal("a", Prefix.Of(BodyOf(right)));
        Assert.Contains("more than 200 deep", Told(deep), StringComparison.Ordinal);
        Assert.Contains("more than 200 deep", Told("a " + string.Concat(Enumerable.Repeat("- ", 4_000)) + "a"), StringComparison.Ordinal);
        Assert.Contains("more than 200 deep", Told(string.Concat(Enumerable.Repeat("a^", 4_000)) + "a"), StringComparison.Ordinal);
        Assert.Contains("more than 200 deep", Told(string.Concat(Enumerable.Repeat("not ", 2_000)) + "a"), StringComparison.Ordinal);
        Assert.Contains("follow from each other", Told(string.Concat(Enumerable.Repeat("a+", 4_000)) + "a"), StringComparison.Ordinal);
        Assert.Contains("longer than 10,000", Told(string.Concat(Enumerable.Repeat("a+", 10_000)) + "a"), StringComparison.Ordinal);
    }

    private static (int Line, int Column) At(Expression expression) => (expression.Position.Line, expression.Position.Column);

    private static Expression BodyOf(string formula)
    {
        DiagnosticList diagnostics = new();
        Swarm.Engine.Models.Documents.SourceText source = new("model.yaml", "\n\n\n\n\n         " + formula);
        int start = source.Text.Length - formula.Length;
        Swarm.Engine.Models.Documents.ScalarNode node = new(
            source,
            start,
            source.Text.Length,
            formula,
            YamlDotNet.Core.ScalarStyle.Plain);
        Expression? body = FormulaParser.Parse(node, diagnostics);
        Assert.True(body is not null, string.Join('\n', diagnostics.InOrder("model.yaml")));
        return body;
    }

    private static string Document(string entry) => $"model: m\ndraws:\n  a: normal(mean=0, sd=1)\noutcomes: {{a: {{}}}}\nformulas:\n  {entry}\n";

    private static string Told(string formula) => Documents.Told(Document("x: " + formula))[0];
}
