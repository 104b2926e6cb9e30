using Swarm.Engine.Numerics;

namespace Swarm.Engine.Models.Formulas;

/// <summary>Value of an expression without references, by the engine's own functions so that its bits are the same everywhere.</summary>
internal static class ConstantValue
{
    /// <summary>The value, or null where the expression refers to quantities.</summary>
    public static double? Of(Expression expression) => expression switch
    {
        NumberExpression number => number.Value,
        UnaryExpression { Operator: UnaryOperator.Negate } unary => -Of(unary.Operand),
        UnaryExpression unary => Of(unary.Operand) is double value ? Truth(value == 0) : null,
        BinaryExpression binary => Of(binary.Left) is double left && Of(binary.Right) is double right
            ? Binary(binary.Operator, left, right)
            : null,
        CallExpression call => Call(call),
        _ => null,
    };

    private static double? Call(CallExpression call)
    {
        double[] arguments = new double[call.Arguments.Count];
        for (int i = 0; i < arguments.Length; i++)
        {
            if (Of(call.Arguments[i]) is not double value)
            {
                return null;
            }

            arguments[i] = value;
        }

        return Call(call.Function, arguments);
    }

    private static double Call(Function function, double[] a) => function switch
    {
        Function.If => a[0] != 0 ? a[1] : a[2],
        Function.Min => a.Aggregate(Math.Min),
        Function.Max => a.Aggregate(Math.Max),
        Function.Abs => Math.Abs(a[0]),
        Function.Exp => Elementary.Exp(a[0]),
        Function.Log => Elementary.Log(a[0]),
        Function.Sqrt => Math.Sqrt(a[0]),
        Function.Floor => Math.Floor(a[0]),
        _ => Math.Min(Math.Max(a[0], a[1]), a[2]),
    };

    private static double Binary(BinaryOperator operation, double a, double b) => operation switch
    {
        BinaryOperator.Add => a + b,
        BinaryOperator.Subtract => a - b,
        BinaryOperator.Multiply => a * b,
        BinaryOperator.Divide => a / b,
        BinaryOperator.Power => Elementary.Pow(a, b),
        BinaryOperator.Less => Truth(a < b),
        BinaryOperator.LessOrEqual => Truth(a <= b),
        BinaryOperator.Greater => Truth(a > b),
        BinaryOperator.GreaterOrEqual => Truth(a >= b),
        BinaryOperator.Equal => Truth(a == b),
        BinaryOperator.NotEqual => Truth(a != b),
        BinaryOperator.And => Truth(a != 0 && b != 0),
        _ => Truth(a != 0 || b != 0),
    };

    private static double Truth(bool value) => value ? 1 : 0;
}
