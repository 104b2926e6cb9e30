using System.Globalization;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Tests.Models;

/// <summary>Writes an expression with every operator in front of its operands, so that its structure is plain to see.</summary>
internal static class Prefix
{
    public static string Of(Expression expression) => expression switch
    {
        NumberExpression number => number.Value.ToString("R", CultureInfo.InvariantCulture),
        ReferenceExpression { Index: StepIndex.None } reference => reference.Name,
        ReferenceExpression { Index: StepIndex.Current } reference => $"{reference.Name}[t]",
        ReferenceExpression { Index: StepIndex.Previous } reference => $"{reference.Name}[t-1]",
        ReferenceExpression { Index: StepIndex.Fixed } reference => $"{reference.Name}[{reference.Step}]",
        ReferenceExpression reference => $"{reference.Name}[horizon]",
        UnaryExpression unary => $"({unary.Operator} {Of(unary.Operand)})",
        BinaryExpression binary => $"({binary.Operator} {Of(binary.Left)} {Of(binary.Right)})",
        CallExpression call => $"({call.Function} {string.Join(' ', call.Arguments.Select(Of))})",
        OverStepsExpression reduction => $"({reduction.Reduction} {Of(reduction.Operand)})",
        _ => throw new InvalidOperationException($"{expression.GetType().Name} is new here"),
    };
}
