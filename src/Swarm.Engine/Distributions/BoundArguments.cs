namespace Swarm.Engine.Distributions;

/// <summary>Values of a form's parameters: complete, of the right kinds, finite.</summary>
/// <param name="values">The numbers of each parameter; a single one for <see cref="ParameterKind.Number"/>.</param>
public sealed class BoundArguments(IReadOnlyDictionary<string, IReadOnlyList<double>> values)
{
    /// <summary>Value of a parameter that takes one number.</summary>
    public double Number(string parameter) => values[parameter][0];

    /// <summary>Values of a parameter that takes a list.</summary>
    public IReadOnlyList<double> Numbers(string parameter) => values[parameter];
}
