using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Models;

/// <summary>A model that was read and found without error: every name is known, every index exists, nothing is circular.</summary>
public sealed record Model
{
    /// <summary>The document's own title.</summary>
    public required string Title { get; init; }

    /// <summary>Unit of money that figures are shown in, or null.</summary>
    public Money? Money { get; init; }

    /// <summary>Last step of quantities with <c>[t]</c>; 0 if the model has none.</summary>
    public int Horizon { get; init; }

    /// <summary>Random inputs, in the order of the document (the order means nothing).</summary>
    public IReadOnlyList<Draw> Draws { get; init; } = [];

    /// <summary>Formulas, in the order of the document (the order means nothing).</summary>
    public IReadOnlyList<Formula> Formulas { get; init; } = [];

    /// <summary>Triangles of past claims, with the method that turns each into unpaid claims.</summary>
    public IReadOnlyList<TriangleInput> Triangles { get; init; } = [];

    /// <summary>What the model reports on, in the order of the document.</summary>
    public IReadOnlyList<Outcome> Outcomes { get; init; } = [];
}

/// <summary>Ways to break a triangle's unpaid claims down.</summary>
public enum Breakdown
{
    /// <summary>By origin period.</summary>
    Origin,

    /// <summary>By future calendar period: the payment pattern.</summary>
    Calendar,
}

/// <summary>The unit of money.</summary>
/// <param name="Unit">Its name, as in "crown".</param>
/// <param name="Scale">How many units one shown unit stands for, as in 1000.</param>
public sealed record Money(string Unit, double Scale);

/// <summary>The left side of a draw or formula: <c>shock</c>, <c>fund[t]</c> or <c>fund[0]</c>.</summary>
/// <param name="Name">Dotted name without its index.</param>
/// <param name="Kind">Once per trial, for each step 1..horizon, or for one given step.</param>
/// <param name="Step">The step when given, else 0.</param>
public readonly record struct QuantityName(string Name, QuantityKind Kind, int Step)
{
    /// <summary>The name as it is written in a document.</summary>
    public override string ToString() => Kind switch
    {
        QuantityKind.PerTrial => Name,
        QuantityKind.PerStep => $"{Name}[t]",
        _ => $"{Name}[{Step}]",
    };
}

/// <summary>How often a quantity exists.</summary>
public enum QuantityKind
{
    /// <summary>Once per trial.</summary>
    PerTrial,

    /// <summary>For each step 1..horizon.</summary>
    PerStep,

    /// <summary>For one given step (the start value of a quantity with <c>[t]</c>).</summary>
    AtStep,
}

/// <summary>A named random input.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Distribution">Its distribution with bound parameters.</param>
/// <param name="Stream">The name that keys its random numbers: its own, unless <c>stream:</c> says otherwise.</param>
/// <param name="Position">Where it stands.</param>
public sealed record Draw(QuantityName Name, Distributions.Distribution Distribution, string Stream, SourcePosition Position);

/// <summary>A quantity computed from others.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Body">The right side.</param>
/// <param name="Position">Where it stands.</param>
public sealed record Formula(QuantityName Name, Expression Body, SourcePosition Position);

/// <summary>A quantity that the model reports on.</summary>
public sealed record Outcome
{
    /// <summary>The quantity's name without its index.</summary>
    public required string Name { get; init; }

    /// <summary>Once per trial, for every step, or at one step.</summary>
    public required QuantityKind Kind { get; init; }

    /// <summary>The step when <see cref="Kind"/> is <see cref="QuantityKind.AtStep"/>.</summary>
    public int Step { get; init; }

    /// <summary>Which end hurts.</summary>
    public Adverse Adverse { get; init; } = Adverse.High;

    /// <summary>Probability levels of VaR and TVaR, as asked or by default.</summary>
    public IReadOnlyList<double> Levels { get; init; } = DefaultLevels;

    /// <summary>Thresholds whose exceedance probability is asked.</summary>
    public IReadOnlyList<double> Above { get; init; } = [];

    /// <summary>Parts of a triangle's unpaid claims that are reported beside their total; empty for other outcomes.</summary>
    public IReadOnlyList<Breakdown> By { get; init; } = [];

    /// <summary>True if a picture over steps is asked.</summary>
    public bool Fan { get; init; }

    /// <summary>True if the quantity is money (not a probability, count or rate) as far as the document says.</summary>
    public bool IsMoney { get; init; } = true;

    /// <summary>Where it stands.</summary>
    public SourcePosition Position { get; init; }

    /// <summary>Levels of an outcome that asks for none.</summary>
    public static IReadOnlyList<double> DefaultLevels { get; } = [0.5, 0.75, 0.9, 0.95, 0.99, 0.995];
}
