using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>A triangle with everything that its method makes of it before the first random number.</summary>
public sealed class ReservingFit
{
    // A coefficient of variation of a millionth: what is left is rounding.
    private const double NegligibleVariance = 1e-12;

    private ReservingFit(ChainLadder chainLadder, OdpFit? odp, Mack? mack, Booking booking)
    {
        ChainLadder = chainLadder;
        Odp = odp;
        Mack = mack;
        Booking = booking;
    }

    /// <summary>The deterministic chain ladder.</summary>
    public ChainLadder ChainLadder { get; }

    /// <summary>The model behind the bootstrap; null for Mack's method.</summary>
    public OdpFit? Odp { get; }

    /// <summary>Mack's standard errors; null for the bootstrap.</summary>
    public Mack? Mack { get; }

    /// <summary>The move to the booked estimate.</summary>
    public Booking Booking { get; }

    /// <summary>Fits a triangle.</summary>
    /// <param name="triangle">The triangle.</param>
    /// <param name="options">Method and options.</param>
    /// <param name="findings">Receives errors and warnings.</param>
    /// <returns>The fit, or null if there was an error.</returns>
    public static ReservingFit? Of(Triangle triangle, ReservingOptions options, ICollection<Finding> findings)
    {
        CheckProcess(options, findings);
        ChainLadder? chainLadder = ChainLadder.Fit(triangle, options, findings);
        if (chainLadder is null)
        {
            return null;
        }

        Booking? booking = Booking.Of(options.Booked, chainLadder, findings);
        OdpFit? odp = options.Method == ReservingMethod.OdpBootstrap ? OdpFit.Fit(chainLadder, findings) : null;
        Mack? mack = options.Method == ReservingMethod.Mack ? Mack.Fit(chainLadder, findings) : null;
        if (odp is not null)
        {
            CheckScales(odp, findings);
        }

        return findings.Any(finding => finding.Severity == Severity.Error)
            ? null
            : new ReservingFit(chainLadder, odp, mack, booking!);
    }

    private static void CheckProcess(ReservingOptions options, ICollection<Finding> findings)
    {
        if (options is { Method: ReservingMethod.OdpBootstrap, Process: ProcessError.Lognormal })
        {
            findings.Add(Finding.Error(
                "a lognormal process error is Mack's, not the over-dispersed Poisson model's", "use process: gamma"));
        }

        if (options is { Method: ReservingMethod.Mack, Process: ProcessError.OverDispersedPoisson })
        {
            findings.Add(Finding.Error(
                "an over-dispersed Poisson process error is not one of Mack's model", "use process: gamma or lognormal"));
        }
    }

    private static void CheckScales(OdpFit odp, ICollection<Finding> findings)
    {
        foreach (ScaleGroup group in odp.Scales)
        {
            double largest = odp.Residuals
                .Where(r => r.Development >= group.First && r.Development <= group.Last)
                .Max(r => r.Fitted);
            if (!(group.Scale > NegligibleVariance * largest))
            {
                findings.Add(Finding.Error(
                    $"developments {group.First + 1} to {group.Last + 1} follow the chain ladder exactly: there is no residual to "
                    + "resample and no scale to simulate with",
                    odp.Options.Scale == ScaleForm.Constant ? "check that the data are not themselves fitted" : "use scale: constant"));
            }
        }
    }
}
