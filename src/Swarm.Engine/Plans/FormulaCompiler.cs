using System.Diagnostics;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Plans;

/// <summary>
/// Compiles one formula at one step. Infinities and NaN flow through + - * and are caught at the formula's end; before an
/// operation that could swallow one (a divisor, a comparison, min, max, exp, ^) its operand is checked, under the condition of
/// the <c>if</c>, <c>and</c>, <c>or</c> around it, so that only what is chosen can fault.
/// </summary>
internal sealed class FormulaCompiler(PlanBuilder plan, Func<Expression, int> resolve, int site)
{
    /// <summary>A register, and whether it can hold NaN or an infinity.</summary>
    private readonly record struct Value(int Register, bool MayFault);

    /// <summary>Compiles the whole formula and checks its result.</summary>
    public int Compile(Expression body)
    {
        return Checked(Visit(body, Operation.None), Operation.None);
    }

    /// <summary>Compiles a step of a reduction: the operand joined to the result of the steps before.</summary>
    public int CompileStep(OverStepsExpression reduction, int? before, bool isLast, int steps)
    {
        bool isOrdered = reduction.Reduction is not (StepReduction.Sum or StepReduction.Mean);
        Value operand = Visit(reduction.Operand, Operation.None);
        int element = isOrdered ? Checked(operand, Operation.None) : operand.Register;
        int joined = before is { } partial ? plan.Apply(Join(reduction.Reduction), partial, element) : First(reduction.Reduction, element);
        int result = isLast && reduction.Reduction == StepReduction.Mean
            ? plan.Apply(OpCode.Divide, joined, plan.Constant(steps))
            : joined;
        return isOrdered ? result : Checked(new Value(result, true), Operation.None);
    }

    private static OpCode Join(StepReduction reduction) => reduction switch
    {
        StepReduction.Sum or StepReduction.Mean => OpCode.Add,
        StepReduction.Any => OpCode.Or,
        StepReduction.All => OpCode.And,
        StepReduction.Largest => OpCode.Max,
        StepReduction.Smallest => OpCode.Min,
        _ => throw new UnreachableException(),
    };

    private int First(StepReduction reduction, int element) =>
        reduction is StepReduction.Any or StepReduction.All ? plan.Apply(OpCode.NotEqual, element, plan.Constant(0)) : element;

    private Value Visit(Expression expression, int condition) => expression switch
    {
        NumberExpression number => new Value(plan.Constant(number.Value), !double.IsFinite(number.Value)),
        ReferenceExpression or OverStepsExpression => new Value(resolve(expression), false),
        UnaryExpression unary => VisitUnary(unary, condition),
        BinaryExpression binary => VisitBinary(binary, condition),
        CallExpression call => VisitCall(call, condition),
        _ => throw new UnreachableException(),
    };

    private Value VisitUnary(UnaryExpression unary, int condition)
    {
        Value operand = Visit(unary.Operand, condition);
        return unary.Operator == UnaryOperator.Negate
            ? new Value(plan.Apply(OpCode.Negate, operand.Register), operand.MayFault)
            : new Value(plan.Apply(OpCode.Not, Checked(operand, condition)), false);
    }

    private Value VisitBinary(BinaryExpression binary, int condition)
    {
        Value left = Visit(binary.Left, condition);
        if (binary.Operator is BinaryOperator.And or BinaryOperator.Or)
        {
            return VisitLogical(binary, Checked(left, condition), condition);
        }

        Value right = Visit(binary.Right, condition);
        switch (binary.Operator)
        {
            case BinaryOperator.Add or BinaryOperator.Subtract or BinaryOperator.Multiply:
                return new Value(plan.Apply(Code(binary.Operator), left.Register, right.Register), true);
            case BinaryOperator.Divide:
                return new Value(plan.Apply(OpCode.Divide, left.Register, Checked(right, condition)), true);
            case BinaryOperator.Power:
                return new Value(plan.Apply(OpCode.Power, Checked(left, condition), Checked(right, condition)), true);
            case BinaryOperator.Greater or BinaryOperator.GreaterOrEqual:
                return new Value(plan.Apply(Code(binary.Operator), Checked(right, condition), Checked(left, condition)), false);
            default:
                return new Value(plan.Apply(Code(binary.Operator), Checked(left, condition), Checked(right, condition)), false);
        }
    }

    /// <summary>The right side counts only where the left has not settled the answer.</summary>
    private Value VisitLogical(BinaryExpression binary, int left, int condition)
    {
        bool isAnd = binary.Operator == BinaryOperator.And;
        int open = isAnd ? left : plan.Apply(OpCode.Not, left);
        int right = Checked(Visit(binary.Right, Both(condition, open)), Both(condition, open));
        return new Value(plan.Apply(isAnd ? OpCode.And : OpCode.Or, left, right), false);
    }

    private Value VisitCall(CallExpression call, int condition)
    {
        if (call.Function == Function.If)
        {
            return VisitIf(call, condition);
        }

        Value[] arguments = [.. call.Arguments.Select(argument => Visit(argument, condition))];
        return call.Function switch
        {
            Function.Min => new Value(Fold(OpCode.Min, arguments, condition), false),
            Function.Max => new Value(Fold(OpCode.Max, arguments, condition), false),
            Function.Clamp => Clamp(arguments, condition),
            Function.Exp => new Value(plan.Apply(OpCode.Exp, Checked(arguments[0], condition)), true),
            Function.Log => new Value(plan.Apply(OpCode.Log, arguments[0].Register), true),
            Function.Sqrt => new Value(plan.Apply(OpCode.Sqrt, arguments[0].Register), true),
            Function.Abs => new Value(plan.Apply(OpCode.Abs, arguments[0].Register), arguments[0].MayFault),
            Function.Floor => new Value(plan.Apply(OpCode.Floor, arguments[0].Register), arguments[0].MayFault),
            _ => throw new UnreachableException(),
        };
    }

    private Value VisitIf(CallExpression call, int condition)
    {
        int chosen = Checked(Visit(call.Arguments[0], condition), condition);
        Value then = Visit(call.Arguments[1], Both(condition, chosen));
        Value otherwise = Visit(call.Arguments[2], Both(condition, plan.Apply(OpCode.Not, chosen)));
        int register = plan.Apply(OpCode.Select, chosen, then.Register, otherwise.Register);
        return new Value(register, then.MayFault || otherwise.MayFault);
    }

    private Value Clamp(Value[] arguments, int condition)
    {
        int floored = plan.Apply(OpCode.Max, Checked(arguments[0], condition), Checked(arguments[1], condition));
        return new Value(plan.Apply(OpCode.Min, floored, Checked(arguments[2], condition)), false);
    }

    private int Fold(OpCode code, Value[] arguments, int condition)
    {
        int result = Checked(arguments[0], condition);
        foreach (Value argument in arguments.Skip(1))
        {
            result = plan.Apply(code, result, Checked(argument, condition));
        }

        return result;
    }

    private int Both(int condition, int also) =>
        condition == Operation.None ? also : plan.Apply(OpCode.And, condition, also);

    private int Checked(Value value, int condition)
    {
        bool isSafe = !value.MayFault || (plan.IsConstant(value.Register, out double constant) && double.IsFinite(constant));
        if (!isSafe)
        {
            plan.Perform(OpCode.CheckFinite, value.Register, condition, site);
        }

        return value.Register;
    }

    private static OpCode Code(BinaryOperator binary) => binary switch
    {
        BinaryOperator.Add => OpCode.Add,
        BinaryOperator.Subtract => OpCode.Subtract,
        BinaryOperator.Multiply => OpCode.Multiply,
        BinaryOperator.Less or BinaryOperator.Greater => OpCode.Less,
        BinaryOperator.LessOrEqual or BinaryOperator.GreaterOrEqual => OpCode.LessOrEqual,
        BinaryOperator.Equal => OpCode.Equal,
        BinaryOperator.NotEqual => OpCode.NotEqual,
        _ => throw new UnreachableException(),
    };
}
