namespace Swarm.Engine.Reserving;

/// <summary>
/// How a distribution is moved to a booked best estimate. The reference is the chain-ladder reserve, not a simulated mean, so that
/// the move is the same for every number of trials.
/// </summary>
/// <param name="Scale">What every amount is multiplied by; 1 for a shift.</param>
/// <param name="Shift">What is added to the total; 0 for a scaling.</param>
/// <param name="Reserve">The chain-ladder reserve.</param>
public sealed record Booking(double Scale, double Shift, double Reserve)
{
    /// <summary>Leaves every amount where it is.</summary>
    public static Booking None { get; } = new(1, 0, 1);

    /// <summary>What is added to an amount with a given chain-ladder mean: its share of the shift.</summary>
    public double ShiftOf(double mean) => Shift * (mean / Reserve);

    /// <summary>The move to a booked estimate, or null after an error was added to the findings.</summary>
    public static Booking? Of(BookedEstimate? booked, ChainLadder chainLadder, ICollection<Finding> findings)
    {
        if (booked is null)
        {
            return None;
        }

        double reserve = chainLadder.TotalReserve;
        if (!double.IsFinite(booked.BestEstimate) || (booked.Form == BookedForm.Scaling && !(booked.BestEstimate > 0)))
        {
            findings.Add(Finding.Error(
                $"the booked best estimate {booked.BestEstimate} is not above 0", "give the booked amount in the triangle's unit"));
            return null;
        }

        if (!(reserve > 0))
        {
            findings.Add(Finding.Error(
                $"the chain-ladder reserve is {reserve}, so there is nothing to move to the booked estimate",
                "leave booked: out"));
            return null;
        }

        return booked.Form == BookedForm.Scaling
            ? new Booking(booked.BestEstimate / reserve, 0, reserve)
            : new Booking(1, booked.BestEstimate - reserve, reserve);
    }
}
