using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Names;

/// <summary>What depends on what among the formulas of a model, step by step.</summary>
internal sealed class DependencyGraph
{
    private readonly Dictionary<string, int> _byName = new(StringComparer.Ordinal);
    private readonly List<DependencyUnit> _units = [];
    private readonly HashSet<string> _withStart;

    public DependencyGraph(IReadOnlyList<Formula> formulas, int horizon)
    {
        Horizon = horizon;
        _withStart = [.. formulas.Where(f => f.Name.Kind == QuantityKind.AtStep).Select(f => f.Name.Name)];
        foreach (Formula formula in formulas)
        {
            Declare(formula);
        }

        foreach (Formula formula in formulas)
        {
            Connect(formula);
        }

        foreach (DependencyUnit unit in _units)
        {
            unit.Base = Instances;
            Instances += unit.IsStepped ? horizon + 1 : 1;
        }
    }

    public int Horizon { get; }

    public IReadOnlyList<DependencyUnit> Units => _units;

    /// <summary>Number of instances of all units.</summary>
    public int Instances { get; }

    private void Declare(Formula formula)
    {
        if (!_byName.ContainsKey(formula.Name.Name))
        {
            _byName.Add(formula.Name.Name, Add(new DependencyUnit(formula.Name.Name, formula.Position)
            {
                IsStepped = formula.Name.Kind != QuantityKind.PerTrial,
            }));
        }
    }

    private int Add(DependencyUnit unit)
    {
        _units.Add(unit);
        return _units.Count - 1;
    }

    private void Connect(Formula formula)
    {
        DependencyUnit unit = _units[_byName[formula.Name.Name]];
        DependencyUnit shared = unit;
        if (formula.Name.Kind == QuantityKind.PerStep)
        {
            shared = new DependencyUnit(null, formula.Position);
            unit.Fixed.Add((Add(shared), 0));
        }

        List<(int Unit, int Step)> instances = formula.Name.Kind == QuantityKind.AtStep ? unit.Start : shared.Fixed;
        foreach (Expression part in Distinct(ExpressionWalk.Direct(formula.Body)))
        {
            if (part is OverStepsExpression reduction)
            {
                instances.Add((AddReduction(reduction, formula.Position), 0));
            }
            else
            {
                Connect((ReferenceExpression)part, formula.Name.Kind == QuantityKind.PerStep ? unit : null, instances);
            }
        }
    }

    private int AddReduction(OverStepsExpression reduction, SourcePosition position)
    {
        ReferenceExpression[] references = [.. Distinct(ExpressionWalk.Direct(reduction.Operand)).OfType<ReferenceExpression>()];
        bool hasStart = references.All(r => r.Index != StepIndex.Previous && (r.Index != StepIndex.Current || _withStart.Contains(r.Name)));
        DependencyUnit unit = new(null, position) { ReducesFrom = hasStart ? 0 : 1 };
        foreach (ReferenceExpression reference in references)
        {
            Connect(reference, unit, unit.Fixed);
        }

        return Add(unit);
    }

    /// <summary>Adds what a reference needs; what <see cref="ReferenceCheck"/> refuses is passed over.</summary>
    /// <param name="reference">The reference.</param>
    /// <param name="unit">The unit whose step <c>[t]</c> means; null where no step is current.</param>
    /// <param name="instances">Where instances at given steps go.</param>
    private void Connect(ReferenceExpression reference, DependencyUnit? unit, List<(int Unit, int Step)> instances)
    {
        if (!_byName.TryGetValue(reference.Name, out int target) || _units[target].IsStepped != (reference.Index != StepIndex.None))
        {
            return;
        }

        switch (reference.Index)
        {
            case StepIndex.Current:
                unit?.Current.Add(target);
                break;
            case StepIndex.Previous:
                unit?.Previous.Add(target);
                break;
            case StepIndex.Fixed when reference.Step > Horizon:
                break;
            default:
                instances.Add((target, reference.Index == StepIndex.Horizon ? Horizon : reference.Step));
                break;
        }
    }

    private static IEnumerable<Expression> Distinct(IEnumerable<Expression> parts) => parts.DistinctBy(part => part switch
    {
        ReferenceExpression reference => (object)(reference.Name, reference.Index, reference.Step),
        _ => part.Position,
    });
}
