using System.Globalization;
using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Plans;

/// <summary>Every quantity of a model at every step, with its definition and what it depends on.</summary>
internal sealed class QuantityGraph
{
    private readonly Dictionary<Instance, Definition> _definitions = [];
    private readonly Dictionary<OverStepsExpression, string> _reductions = new(ReferenceEqualityComparer.Instance);

    public QuantityGraph(Model model, IReadOnlyList<Component> components)
    {
        Horizon = model.Horizon;
        foreach (Draw draw in model.Draws)
        {
            Define(draw.Name, new DrawDefinition(draw));
        }

        // Start values last: they take the place of a formula for every step.
        foreach (Formula formula in model.Formulas.OrderBy(f => f.Name.Kind == QuantityKind.AtStep))
        {
            Define(formula.Name, new FormulaDefinition(formula.Body));
        }

        for (int i = 0; i < components.Count; i++)
        {
            DefineOutputs(components[i], i);
        }
    }

    public int Horizon { get; }

    public Definition this[Instance instance] => _definitions[instance];

    /// <summary>What an instance needs to be computed first.</summary>
    public IEnumerable<Instance> Dependencies(Instance instance) => _definitions[instance] switch
    {
        FormulaDefinition formula => Of(formula.Body, instance.Step),
        AccumulationDefinition accumulation => OfAccumulation(accumulation, instance),
        _ => [],
    };

    /// <summary>The instance that holds a reduction's result.</summary>
    public Instance Result(OverStepsExpression reduction)
    {
        if (!_reductions.TryGetValue(reduction, out string? name))
        {
            // No quantity's name has a '#', so these cannot clash.
            name = string.Create(CultureInfo.InvariantCulture, $"#{_reductions.Count}");
            _reductions.Add(reduction, name);
            int first = FirstStep(reduction);
            for (int step = first; step <= Horizon; step++)
            {
                _definitions.Add(new Instance(name, step), new AccumulationDefinition(reduction, first));
            }
        }

        return new Instance(name, Horizon);
    }

    /// <summary>Step 0 is included where everything that the operand refers to at a step exists there.</summary>
    private int FirstStep(OverStepsExpression reduction)
    {
        foreach (ReferenceExpression reference in References.Direct(reduction.Operand).OfType<ReferenceExpression>())
        {
            bool isMissing = reference.Index == StepIndex.Previous
                || (reference.Index == StepIndex.Current && !_definitions.ContainsKey(new Instance(reference.Name, 0)));
            if (isMissing)
            {
                return 1;
            }
        }

        return 0;
    }

    private IEnumerable<Instance> Of(Expression body, int step) => References.Direct(body).Select(part => part switch
    {
        ReferenceExpression reference => References.Resolve(reference, step, Horizon),
        _ => Result((OverStepsExpression)part),
    });

    private IEnumerable<Instance> OfAccumulation(AccumulationDefinition accumulation, Instance instance)
    {
        IEnumerable<Instance> operand = Of(accumulation.Reduction.Operand, instance.Step);
        return instance.Step == accumulation.FirstStep
            ? operand
            : operand.Prepend(instance with { Step = instance.Step - 1 });
    }

    private void Define(QuantityName name, Definition definition)
    {
        switch (name.Kind)
        {
            case QuantityKind.PerTrial:
                _definitions[new Instance(name.Name, Instance.PerTrial)] = definition;
                break;
            case QuantityKind.AtStep:
                _definitions[new Instance(name.Name, name.Step)] = definition;
                break;
            default:
                for (int step = 1; step <= Horizon; step++)
                {
                    _definitions[new Instance(name.Name, step)] = definition;
                }

                break;
        }
    }

    private void DefineOutputs(Component component, int index)
    {
        for (int output = 0; output < component.Outputs.Count; output++)
        {
            _definitions[new Instance(component.Outputs[output], Instance.PerTrial)] = new ComponentDefinition(index, output);
        }

        foreach ((string name, int step, string? output) in component.Stepped(Horizon))
        {
            Expression value = output is null
                ? new NumberExpression(0, default)
                : new ReferenceExpression(output, StepIndex.None, 0, default);
            _definitions[new Instance(name, step)] = new FormulaDefinition(value);
        }
    }
}
