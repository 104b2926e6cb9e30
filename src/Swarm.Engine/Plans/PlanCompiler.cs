using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Plans;

/// <summary>From a model and a seed to a plan.</summary>
internal sealed class PlanCompiler
{
    private readonly QuantityGraph _graph;
    private readonly ulong _seed;
    private readonly IReadOnlyList<Component> _components;
    private readonly PlanBuilder _plan = new();
    private readonly Dictionary<Instance, int> _registers = [];
    private readonly int[]?[] _componentTargets;

    private PlanCompiler(Model model, ulong seed, IReadOnlyList<Component> components)
    {
        _graph = new QuantityGraph(model, components);
        _seed = seed;
        _components = components;
        _componentTargets = new int[]?[components.Count];
    }

    /// <summary>Compiles a model that was read without error.</summary>
    /// <param name="model">The model.</param>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="components">The model's components.</param>
    /// <param name="outcomes">What is to be emitted, in order.</param>
    public static CompiledModel Compile(
        Model model, ulong seed, IReadOnlyList<Component> components, IReadOnlyList<Instance> outcomes)
    {
        var compiler = new PlanCompiler(model, seed, components);
        return compiler.Compile(outcomes);
    }

    private CompiledModel Compile(IReadOnlyList<Instance> outcomes)
    {
        IReadOnlyList<Instance> order = Schedule.Of(_graph, outcomes);
        ReserveComponentOutputs(order);
        ILookup<Instance, int> emitted = outcomes.Select((instance, i) => (instance, i)).ToLookup(o => o.instance, o => o.i);
        foreach (Instance instance in order)
        {
            int register = CompileInstance(instance);
            _registers.Add(instance, register);
            foreach (int outcome in emitted[instance])
            {
                _plan.Perform(OpCode.Emit, register, outcome);
            }
        }

        return new CompiledModel(Allocated(outcomes), Traceable(outcomes));
    }

    /// <summary>A component runs once, when the first of its outputs is needed, and writes all that are.</summary>
    private void ReserveComponentOutputs(IReadOnlyList<Instance> order)
    {
        foreach (Instance instance in order)
        {
            if (_graph[instance] is ComponentDefinition definition)
            {
                int[] targets = _componentTargets[definition.Component] ??= NoTargets(_components[definition.Component]);
                targets[definition.Output] = _plan.NewRegister();
            }
        }
    }

    private static int[] NoTargets(Component component)
    {
        int[] targets = new int[component.Outputs.Count];
        Array.Fill(targets, Operation.None);
        return targets;
    }

    private int CompileInstance(Instance instance) => _graph[instance] switch
    {
        DrawDefinition draw => CompileDraw(draw.Draw, instance),
        FormulaDefinition formula => CompileFormula(formula.Body, instance),
        ComponentDefinition component => CompileComponent(component, instance),
        AccumulationDefinition accumulation => CompileAccumulation(accumulation, instance),
        _ => throw new System.Diagnostics.UnreachableException(),
    };

    private int CompileDraw(Draw draw, Instance instance)
    {
        int step = Math.Max(instance.Step, 0);
        int register = _plan.AddDraw(new PlanDraw(draw.Distribution, StreamKey.Of(_seed, StreamRoles.Draw, draw.Stream), step));
        if (draw.Distribution.CanOverflow)
        {
            _plan.Perform(OpCode.CheckFinite, register, Operation.None, AddSite(instance, []));
        }

        return register;
    }

    private int CompileFormula(Expression body, Instance instance) =>
        new FormulaCompiler(_plan, Resolver(instance.Step), AddSite(instance, [body])).Compile(body);

    private int CompileComponent(ComponentDefinition definition, Instance instance)
    {
        int[] targets = _componentTargets[definition.Component]!;
        if (!_plan.Components.Exists(known => known.Component == _components[definition.Component]))
        {
            _plan.AddComponent(new PlanComponent(_components[definition.Component], targets));
        }

        int register = targets[definition.Output];
        _plan.Perform(OpCode.CheckFinite, register, Operation.None, AddSite(instance, []));
        return register;
    }

    private int CompileAccumulation(AccumulationDefinition accumulation, Instance instance)
    {
        bool isFirst = instance.Step == accumulation.FirstStep;
        int? before = isFirst ? null : _registers[instance with { Step = instance.Step - 1 }];
        int steps = _graph.Horizon - accumulation.FirstStep + 1;
        OverStepsExpression reduction = accumulation.Reduction;
        var site = new Instance($"{reduction.Reduction.ToString().ToLowerInvariant()} over steps", instance.Step);
        return new FormulaCompiler(_plan, Resolver(instance.Step), AddSite(site, [reduction.Operand]))
            .CompileStep(reduction, before, instance.Step == _graph.Horizon, steps);
    }

    private Func<Expression, int> Resolver(int step) => part => _registers[part switch
    {
        ReferenceExpression reference => References.Resolve(reference, step, _graph.Horizon),
        _ => _graph.Result((OverStepsExpression)part),
    }];

    private int AddSite(Instance instance, IReadOnlyList<Expression> bodies)
    {
        (string Name, int Register)[] inputs =
        [
            .. bodies.SelectMany(References.Direct)
                .OfType<ReferenceExpression>()
                .Select(reference => References.Resolve(reference, instance.Step, _graph.Horizon))
                .Distinct()
                .Select(input => (input.ToString(), _registers[input])),
        ];
        _plan.FaultSites.Add(new FaultSite(instance.Name, instance.Step == Instance.PerTrial ? null : instance.Step, inputs));
        return _plan.FaultSites.Count - 1;
    }

    private Plan Allocated(IReadOnlyList<Instance> outcomes)
    {
        (Operation[] operations, PlanComponent[] components, int columns) = RegisterAllocation.Of(_plan);
        return Plan(operations, components, columns, outcomes);
    }

    private Plan Traceable(IReadOnlyList<Instance> outcomes) =>
        Plan([.. _plan.Operations], [.. _plan.Components], _plan.Registers, outcomes);

    private Plan Plan(Operation[] operations, PlanComponent[] components, int columns, IReadOnlyList<Instance> outcomes) => new()
    {
        Operations = operations,
        Components = components,
        Columns = columns,
        Constants = [.. _plan.Constants],
        Draws = [.. _plan.Draws],
        FaultSites = [.. _plan.FaultSites],
        Outcomes = [.. outcomes.Select(instance => instance.ToString())],
    };
}
