using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>Recomputes one trial from its number alone, with every quantity open to the eye.</summary>
internal static unsafe class TrialTrace
{
    // The least that a draw fills: the other trials of the group come along.
    private const int GroupTrials = 16;

    /// <summary>What a fault was made of.</summary>
    public static Fault Explain(CompiledModel model, TileFault fault)
    {
        Plan plan = model.Traceable;
        using PlanExecutor executor = Run(plan, fault.Trial);
        Operation check = plan.Operations[fault.Operation];
        FaultSite site = plan.FaultSites[check.C];
        IEnumerable<KeyValuePair<string, double>> inputs =
            site.Inputs.Select(input => KeyValuePair.Create(input.Name, Value(executor, input.Register, fault.Trial)));
        return new Fault(fault.Trial, site.Quantity, site.Step, Value(executor, check.A, fault.Trial), [.. inputs]);
    }

    private static PlanExecutor Run(Plan plan, long trial)
    {
        var executor = PlanExecutor.Create(plan, LaneWidths.OfThisMachine, GroupTrials);
        double[] outcomes = new double[Math.Max(plan.Outcomes.Length, 1) * GroupTrials];
        fixed (double* destination = outcomes)
        {
            executor.RunTile(trial - (trial % GroupTrials), GroupTrials, destination, GroupTrials);
        }

        return executor;
    }

    private static double Value(PlanExecutor executor, int register, long trial) =>
        executor.Column(register)[register < 0 ? 0 : (int)(trial % GroupTrials)];
}
