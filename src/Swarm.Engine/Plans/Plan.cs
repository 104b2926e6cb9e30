using Swarm.Engine.Distributions;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Plans;

/// <summary>A model compiled to a list of operations on columns, for one seed. Immutable; every thread runs the same.</summary>
internal sealed record Plan
{
    /// <summary>Operations in an order in which every operand is ready.</summary>
    public required Operation[] Operations { get; init; }

    /// <summary>Number of columns of a tile.</summary>
    public required int Columns { get; init; }

    /// <summary>Values of the constant registers.</summary>
    public required double[] Constants { get; init; }

    /// <summary>What <see cref="OpCode.Draw"/> draws.</summary>
    public required PlanDraw[] Draws { get; init; }

    /// <summary>What <see cref="OpCode.Component"/> runs.</summary>
    public required PlanComponent[] Components { get; init; }

    /// <summary>What <see cref="OpCode.CheckFinite"/> names; registers are those of this plan's operations.</summary>
    public required FaultSite[] FaultSites { get; init; }

    /// <summary>Names of the outcomes that <see cref="OpCode.Emit"/> writes, in order.</summary>
    public required string[] Outcomes { get; init; }
}

/// <summary>A draw at a step.</summary>
internal sealed record PlanDraw(Distribution Distribution, StreamKey Key, int Step);

/// <summary>A component and the register of each of its outputs, or <see cref="Operation.None"/> where it is not used.</summary>
internal sealed record PlanComponent(Component Component, int[] Targets);
