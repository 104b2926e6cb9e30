namespace Swarm.Cli.Output;

/// <summary>What every reader of figures is told beneath them.</summary>
internal static class Cautions
{
    public static IReadOnlyList<string> Lines { get; } =
    [
        "The errors shown are sampling errors of this run alone. Whether the model and its parameters are right is not in them.",
        "These figures are estimates, and no actuarial opinion. Local regulation, professional standards and the judgement of the "
            + "qualified, licensed person who signs come first.",
    ];
}
