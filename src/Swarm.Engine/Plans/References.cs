using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Plans;

/// <summary>What an expression refers to.</summary>
internal static class References
{
    /// <summary>References of an expression outside its reductions over steps, and those reductions themselves.</summary>
    public static IEnumerable<Expression> Direct(Expression expression) => expression switch
    {
        ReferenceExpression or OverStepsExpression => [expression],
        UnaryExpression unary => Direct(unary.Operand),
        BinaryExpression binary => Direct(binary.Left).Concat(Direct(binary.Right)),
        CallExpression call => call.Arguments.SelectMany(Direct),
        _ => [],
    };

    /// <summary>The quantity and step that a reference means inside a formula at a step.</summary>
    public static Instance Resolve(ReferenceExpression reference, int step, int horizon) => reference.Index switch
    {
        StepIndex.None => new Instance(reference.Name, Instance.PerTrial),
        StepIndex.Current => new Instance(reference.Name, step),
        StepIndex.Previous => new Instance(reference.Name, step - 1),
        StepIndex.Fixed => new Instance(reference.Name, reference.Step),
        _ => new Instance(reference.Name, horizon),
    };
}
