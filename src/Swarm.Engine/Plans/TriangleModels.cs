using Swarm.Engine.Models;
using Swarm.Engine.Reserving;
using Swarm.Engine.Reserving.Simulation;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Plans;

/// <summary>From the triangles of a model to components.</summary>
internal static class TriangleModels
{
    /// <summary>One component a triangle, in the order of the model.</summary>
    public static IReadOnlyList<Component> Components(Model model, ulong seed) =>
        [.. model.Triangles.Select(triangle => Component(triangle, seed))];

    /// <summary>Number of periods after the triangle in which its tail is paid; 0 without tail.</summary>
    public static int TailPeriods(TriangleInput input) => Fit(input).ChainLadder.TailPeriods;

    private static TriangleComponent Component(TriangleInput input, ulong seed)
    {
        ReservingFit fit = Fit(input);
        return input.Options.Method == ReservingMethod.Mack
            ? TriangleComponent.OfMack(input.Name, input.Triangle, SimulationInputs.Mack(fit, seed, input.Stream))
            : TriangleComponent.OfBootstrap(input.Name, input.Triangle, SimulationInputs.Bootstrap(fit, seed, input.Stream));
    }

    private static ReservingFit Fit(TriangleInput input) => ReservingFit.Of(input.Triangle, input.Options, [])
        ?? throw new InvalidOperationException($"The reader let triangle '{input.Name}' pass, which cannot be fitted.");
}
