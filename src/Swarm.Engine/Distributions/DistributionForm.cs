namespace Swarm.Engine.Distributions;

/// <summary>
/// A way to write a distribution in a model: its name, its parameters by name, and how values of them become the distribution.
/// Several forms may share a name, as <c>lognormal(mean, sd)</c> and <c>lognormal(log_mean, log_sd)</c> do; the parameters' names
/// tell them apart.
/// </summary>
/// <param name="Name">The name before the bracket.</param>
/// <param name="Parameters">Its parameters; all must be given.</param>
/// <param name="Help">One line for the reader of a model.</param>
/// <param name="Bind">Makes the distribution, or says what is wrong with the values.</param>
public sealed record DistributionForm(
    string Name, IReadOnlyList<ParameterForm> Parameters, string Help, Func<BoundArguments, DistributionBinding> Bind)
{
    /// <summary>How a call looks: <c>normal(mean, sd)</c>.</summary>
    public string Signature => $"{Name}({string.Join(", ", Parameters.Select(p => p.Name))})";
}

/// <summary>A parameter of a distribution.</summary>
/// <param name="Name">Its name in a call.</param>
/// <param name="Kind">A number or a list.</param>
/// <param name="Help">What it is, with its range.</param>
public sealed record ParameterForm(string Name, ParameterKind Kind, string Help);

/// <summary>What a parameter takes.</summary>
public enum ParameterKind
{
    /// <summary>One number.</summary>
    Number,

    /// <summary>A list of numbers, at least one.</summary>
    Numbers,
}
