using System.Globalization;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Tests.Models;

/// <summary>Writes an expression as a model would, every operation in brackets.</summary>
internal static class Printed
{
    public static string Of(Expression expression) => expression switch
    {
        NumberExpression number => number.Value.ToString("R", CultureInfo.InvariantCulture),
        ReferenceExpression reference => Prefix.Of(reference),
        UnaryExpression unary => $"({(unary.Operator == UnaryOperator.Not ? "not " : "-")}{Of(unary.Operand)})",
        BinaryExpression binary => $"({Of(binary.Left)} {Symbol(binary.Operator)} {Of(binary.Right)})",
        CallExpression call => $"{call.Function.ToString().ToLowerInvariant()}({string.Join(", ", call.Arguments.Select(Of))})",
        OverStepsExpression reduction => $"{reduction.Reduction.ToString().ToLowerInvariant()}({Of(reduction.Operand)})",
        _ => throw new InvalidOperationException($"{expression.GetType().Name} is new here"),
    };

    private static string Symbol(BinaryOperator operation) => operation switch
    {
        BinaryOperator.Add => "+",
        BinaryOperator.Subtract => "-",
        BinaryOperator.Multiply => "*",
        BinaryOperator.Divide => "/",
        BinaryOperator.Power => "^",
        BinaryOperator.Less => "<",
        BinaryOperator.LessOrEqual => "<=",
        BinaryOperator.Greater => ">",
        BinaryOperator.GreaterOrEqual => ">=",
        BinaryOperator.Equal => "==",
        BinaryOperator.NotEqual => "!=",
        BinaryOperator.And => "and",
        _ => "or",
    };
}
