namespace Swarm.Engine.Distributions;

/// <summary>Every distribution that a model can name. A new one is a file beside the others and a line here.</summary>
public static class DistributionCatalogue
{
    /// <summary>The forms, by name.</summary>
    public static IReadOnlyList<DistributionForm> Forms { get; } =
    [
        Gamma.Form,
        Lognormal.FormOfMeanAndSd,
        Lognormal.FormOfLogs,
        Normal.Form,
        OneOf.Form,
        ContinuousUniform.Form,
    ];
}
