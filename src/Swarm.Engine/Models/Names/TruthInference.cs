using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Names;

/// <summary>Tells quantities that are true or false, whose mean is a probability, from amounts.</summary>
/// <param name="formulas">The model's formulas.</param>
internal sealed class TruthInference(IReadOnlyList<Formula> formulas)
{
    // Enough for names that stand for names; a chain beyond it counts as an amount.
    private const int MaxDepth = 100;

    private readonly ILookup<string, Formula> _formulas = formulas.ToLookup(formula => formula.Name.Name, StringComparer.Ordinal);

    /// <summary>True if every formula of the name yields a truth.</summary>
    public bool IsTruth(string name) => IsTruth(name, 0);

    private bool IsTruth(string name, int depth) =>
        depth < MaxDepth && _formulas.Contains(name) && _formulas[name].Where(f => f.Name.Kind != QuantityKind.AtStep).Any()
        && _formulas[name].Where(f => f.Name.Kind != QuantityKind.AtStep).All(formula => IsTruth(formula.Body, depth + 1));

    private bool IsTruth(Expression expression, int depth) => expression switch
    {
        UnaryExpression unary => unary.Operator == UnaryOperator.Not,
        BinaryExpression binary => binary.Operator is BinaryOperator.And or BinaryOperator.Or || IsComparison(binary.Operator),
        OverStepsExpression reduction => reduction.Reduction is StepReduction.Any or StepReduction.All,
        ReferenceExpression reference => IsTruth(reference.Name, depth),
        _ => false,
    };

    private static bool IsComparison(BinaryOperator operation) => operation is BinaryOperator.Less or BinaryOperator.LessOrEqual
        or BinaryOperator.Greater or BinaryOperator.GreaterOrEqual or BinaryOperator.Equal or BinaryOperator.NotEqual;
}
