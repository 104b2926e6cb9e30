namespace Swarm.Engine.Plans;

/// <summary>A result that is no number: the run stops, since nothing is dropped in silence.</summary>
/// <param name="Trial">The lowest faulting trial of the run, from 0.</param>
/// <param name="Quantity">The quantity whose formula, or part of it, gave no finite number.</param>
/// <param name="Step">Its step, or null for a quantity that exists once per trial.</param>
/// <param name="Value">What came out: NaN or an infinity.</param>
/// <param name="Inputs">The values that went in.</param>
public sealed record Fault(long Trial, string Quantity, int? Step, double Value, IReadOnlyList<KeyValuePair<string, double>> Inputs)
{
    /// <summary>One sentence: trial, quantity, step, value, inputs.</summary>
    public override string ToString()
    {
        string name = Step is { } step ? $"{Quantity}[{step}]" : Quantity;
        string inputs = string.Join(", ", Inputs.Select(input => $"{input.Key} = {input.Value:R}"));
        return $"trial {Trial}: {name} is {Value:R}{(inputs.Length > 0 ? $" from {inputs}" : "")}";
    }
}
