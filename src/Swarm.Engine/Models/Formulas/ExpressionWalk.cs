namespace Swarm.Engine.Models.Formulas;

/// <summary>Walks the parts of an expression.</summary>
internal static class ExpressionWalk
{
    /// <summary>The expression and everything in it.</summary>
    public static IReadOnlyList<Expression> All(Expression expression)
    {
        List<Expression> found = [];
        Stack<Expression> open = new([expression]);
        while (open.TryPop(out Expression? part))
        {
            found.Add(part);
            foreach (Expression child in Children(part))
            {
                open.Push(child);
            }
        }

        return found;
    }

    /// <summary>
    /// References outside of reductions, and the reductions themselves.
    /// </summary>
    public static IReadOnlyList<Expression> Direct(Expression expression)
    {
        List<Expression> found = [];
        Stack<Expression> open = new([expression]);
        while (open.TryPop(out Expression? part))
        {
            if (part is ReferenceExpression or OverStepsExpression)
            {
                found.Add(part);
                continue;
            }

            foreach (Expression child in Children(part))
            {
                open.Push(child);
            }
        }

        return found;
    }

    private static IReadOnlyList<Expression> Children(Expression part) => part switch
    {
        UnaryExpression unary => [unary.Operand],
        BinaryExpression binary => [binary.Left, binary.Right],
        CallExpression call => call.Arguments,
        OverStepsExpression reduction => [reduction.Operand],
        _ => [],
    };
}
