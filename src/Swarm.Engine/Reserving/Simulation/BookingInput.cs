namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Moves every amount to a booked estimate: output k becomes scale times output k plus shift k.</summary>
/// <param name="Scale">1 unless the booking is by scaling.</param>
/// <param name="Shifts">One an output; 0 unless the booking is by shift.</param>
internal sealed record BookingInput(double Scale, double[] Shifts);
