namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Everything that a bootstrap kernel needs to know, the same for all threads.</summary>
/// <param name="Pseudo">What pseudo-triangles are made of.</param>
/// <param name="Process">What becomes of the conditional means.</param>
/// <param name="Booking">Where the distribution is moved to.</param>
/// <param name="Residuals">Key of the picks of residuals.</param>
/// <param name="Amounts">Key of the process error.</param>
/// <param name="Tail">Key of the tail factor.</param>
internal sealed record BootstrapInput(
    PseudoTriangleInput Pseudo,
    ProcessInput Process,
    BookingInput Booking,
    Streams.StreamKey Residuals,
    Streams.StreamKey Amounts,
    Streams.StreamKey Tail);
