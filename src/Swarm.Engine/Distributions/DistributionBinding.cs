namespace Swarm.Engine.Distributions;

/// <summary>A distribution made from parameters, or what is wrong with them.</summary>
public sealed class DistributionBinding
{
    private DistributionBinding(Distribution? distribution, IReadOnlyList<ParameterProblem> problems)
    {
        Distribution = distribution;
        Problems = problems;
    }

    /// <summary>The distribution, or null if there are problems.</summary>
    public Distribution? Distribution { get; }

    /// <summary>What is wrong, parameter by parameter.</summary>
    public IReadOnlyList<ParameterProblem> Problems { get; }

    /// <summary>The parameters are right.</summary>
    public static DistributionBinding Of(Distribution distribution) => new(distribution, []);

    /// <summary>The parameters are wrong.</summary>
    public static DistributionBinding Refused(IReadOnlyList<ParameterProblem> problems)
    {
        ArgumentOutOfRangeException.ThrowIfZero(problems.Count);
        return new(null, problems);
    }

    /// <summary>The distribution where nothing is wrong, else the problems.</summary>
    public static DistributionBinding Of(IReadOnlyList<ParameterProblem> problems, Func<Distribution> make) =>
        problems.Count == 0 ? Of(make()) : Refused(problems);
}

/// <summary>Something wrong with a parameter.</summary>
/// <param name="Parameter">Its name.</param>
/// <param name="Message">What is wrong, as a sentence without a full stop.</param>
/// <param name="Hint">What would be right, or null.</param>
public sealed record ParameterProblem(string Parameter, string Message, string? Hint);
