using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Records;

/// <summary>What the choices of a bootstrap do to it, worked out from its residuals without another run.</summary>
internal static class ChoiceEffects
{
    /// <summary>One sentence a choice; nothing for other methods.</summary>
    public static string? Of(TriangleInput input)
    {
        if (ReservingFit.Of(input.Triangle, input.Options, [])?.Odp is not { } fit)
        {
            return null;
        }

        return $"{input.Name}: {ZeroResiduals(fit)}; {Centring(fit)}; {Scales(fit)}.";
    }

    /// <summary>Residuals that are zero add nothing to the sum of squares, but count in the pool.</summary>
    private static string ZeroResiduals(OdpFit fit)
    {
        int zeros = fit.Residuals.Count(residual => residual.IsCounted && residual.IsZeroByConstruction);
        int others = fit.Residuals.Count(residual => residual.IsCounted) - zeros;
        double widening = Math.Sqrt((double)(others + zeros) / others) - 1;
        return fit.Options.KeepZeroResiduals
            ? $"leaving out the {zeros} residuals that are zero by construction would widen the parameter error by about {widening:P1}"
            : $"keeping the {zeros} residuals that are zero by construction would narrow the parameter error by about {widening:P1}";
    }

    private static string Centring(OdpFit fit)
    {
        if (fit.Options.CentreResiduals)
        {
            return "the residuals' mean was taken out";
        }

        double amounts = 0;
        double shift = 0;
        foreach (Residual residual in fit.Residuals)
        {
            amounts += fit.Mean(residual.Origin, residual.Development);
            shift += fit.PoolMean * fit.Spread(residual.Origin, residual.Development);
        }

        return $"the residuals' mean moves the pseudo-payments by {shift / amounts:+0.00 %;-0.00 %;0.00 %}, which centring would take out";
    }

    private static string Scales(OdpFit fit) => fit.Options.Scale == ScaleForm.ByDevelopment
        ? $"{fit.Scales.Count} scales, the one from the fewest residuals from {fit.Scales.Min(group => group.Residuals)}"
        : $"one scale from {fit.Count} residuals less {fit.Parameters} parameters";
}
