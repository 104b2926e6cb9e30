using Swarm.Engine.Numerics;
using Swarm.Engine.Reserving.Simulation;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving;

/// <summary>Hands a fit to the kernels that simulate it.</summary>
internal static class SimulationInputs
{
    /// <summary>The bootstrap's input.</summary>
    /// <param name="fit">A fit by the bootstrap's method.</param>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="stream">Name that keys the triangle's random numbers.</param>
    public static BootstrapInput Bootstrap(ReservingFit fit, ulong seed, string stream)
    {
        OdpFit odp = fit.Odp ?? throw new ArgumentException("fitted by another method", nameof(fit));
        var shape = new RunOffShape(odp.Triangle, odp.ChainLadder.TailPeriods);
        double[] scales = [.. Enumerable.Range(0, odp.Triangle.Developments + 1).Select(odp.Scale)];
        var process = new ProcessInput(scales, odp.Options.Process, TailShares(fit), TailFactor(odp.ChainLadder.Tail));
        return new BootstrapInput(
            Pseudo(odp, shape),
            process,
            BookingOf(fit, shape),
            StreamKey.Of(seed, StreamRoles.Residuals, stream),
            StreamKey.Of(seed, StreamRoles.Process, stream),
            StreamKey.Of(seed, StreamRoles.Tail, stream));
    }

    /// <summary>The input of Mack's simulation.</summary>
    /// <param name="fit">A fit by Mack's method.</param>
    /// <param name="seed">Seed of the run.</param>
    /// <param name="stream">Name that keys the triangle's random numbers.</param>
    public static MackInput Mack(ReservingFit fit, ulong seed, string stream)
    {
        Mack mack = fit.Mack ?? throw new ArgumentException("fitted by another method", nameof(fit));
        var shape = new RunOffShape(mack.Triangle, mack.ChainLadder.TailPeriods);
        return new MackInput(
            shape,
            [.. Enumerable.Range(0, shape.Origins).Select(mack.Triangle.Latest)],
            [.. mack.Factors],
            [.. mack.FactorErrors],
            mack.Alpha,
            [.. mack.SigmaSquared.Select(Math.Sqrt)],
            TailShares(fit),
            mack.ChainLadder.Options.Process,
            BookingOf(fit, shape),
            StreamKey.Of(seed, StreamRoles.Factors, stream),
            StreamKey.Of(seed, StreamRoles.Process, stream));
    }

    private static PseudoTriangleInput Pseudo(OdpFit odp, RunOffShape shape)
    {
        (int Origin, int Development)[] cells = [.. odp.Residuals.Select(r => (r.Origin, r.Development))];
        return new PseudoTriangleInput(
            shape,
            [.. cells.Select(cell => odp.Mean(cell.Origin, cell.Development))],
            [.. cells.Select(cell => odp.Spread(cell.Origin, cell.Development))],
            [.. odp.Pool],
            [.. cells.Select(cell => Weight(odp, cell.Origin, cell.Development))],
            odp.Options.Average);
    }

    private static double Weight(OdpFit odp, int origin, int development) =>
        development > 0 && odp.ChainLadder.Ratios.IsCounted(origin, development - 1) ? 1 : 0;

    private static double[] TailShares(ReservingFit fit) => [.. fit.ChainLadder.Tail?.Shares ?? []];

    /// <summary>The factor's excess over 1 is lognormal with the tail's mean and standard deviation.</summary>
    private static TailFactorInput? TailFactor(Tail? tail)
    {
        if (tail is null)
        {
            return null;
        }

        double excess = tail.Factor - 1;
        if (tail.Sd == 0)
        {
            return new TailFactorInput(excess, 0, 0);
        }

        double cv = tail.Sd / excess;
        double logVariance = Elementary.Log1p(cv * cv);
        return new TailFactorInput(excess, Elementary.Log(excess) - (0.5 * logVariance), Math.Sqrt(logVariance));
    }

    /// <summary>Shifts in the order of <see cref="RunOffOutputs"/>.</summary>
    private static BookingInput BookingOf(ReservingFit fit, RunOffShape shape)
    {
        ChainLadder chainLadder = fit.ChainLadder;
        double[] means =
        [
            chainLadder.TotalReserve,
            chainLadder.TotalReserve,
            .. Enumerable.Range(0, shape.Origins).Select(chainLadder.Reserve),
            .. Enumerable.Range(0, shape.FuturePeriods).Select(chainLadder.PaidIn),
        ];
        return new BookingInput(fit.Booking.Scale, [.. means.Select(fit.Booking.ShiftOf)]);
    }
}
