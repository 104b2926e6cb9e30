using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Running;

/// <summary>The outcome that is shown while a run is under way: the model's first, at its last step.</summary>
internal sealed class FeaturedOutcome(Model model)
{
    private readonly string _name = model.Outcomes[0].Kind == QuantityKind.PerStep ? $"{model.Outcomes[0].Name}[{model.Horizon}]" : "";
    private int? _place;

    /// <summary>Its figures so far, or null before there are any.</summary>
    public OutcomeFigures? Figures(RunProgress progress)
    {
        if (_name.Length == 0) return progress.Preview(0);
        _place ??= Enumerable.Range(Math.Max(0, model.Horizon - 1), 2).FirstOrDefault(place => progress.Preview(place)?.Name == _name);
        return progress.Preview(_place.Value);
    }
}
