namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Everything that a kernel of Mack's model needs to know. Development k leads from period k to k + 1; the tail, if any, is the
/// last.
/// </summary>
/// <param name="Shape">The triangle's shape.</param>
/// <param name="Latest">Amount to date of each origin.</param>
/// <param name="Factors">Estimated development factors.</param>
/// <param name="FactorErrors">Their standard errors.</param>
/// <param name="Alpha">1 or 0: a link ratio varies as sigma^2 / C^alpha (Mack 1999).</param>
/// <param name="Sigmas">Root of the variance parameter of each development.</param>
/// <param name="TailShares">Share of the tail that is paid in each period after the triangle; empty without tail.</param>
/// <param name="Process">Gamma or lognormal.</param>
/// <param name="Booking">Where the distribution is moved to.</param>
/// <param name="FactorKey">Key of the factors' sampling error.</param>
/// <param name="AmountKey">Key of the process error.</param>
internal sealed record MackInput(
    RunOffShape Shape,
    double[] Latest,
    double[] Factors,
    double[] FactorErrors,
    int Alpha,
    double[] Sigmas,
    double[] TailShares,
    ProcessError Process,
    BookingInput Booking,
    Streams.StreamKey FactorKey,
    Streams.StreamKey AmountKey);
