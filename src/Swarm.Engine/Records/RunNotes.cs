using Swarm.Engine.Models;
using Swarm.Engine.Plans;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Records;

/// <summary>What must be said beside the figures of a run: the methods that were chosen, and what happened.</summary>
public static class RunNotes
{
    /// <summary>Notes in the order of the model's components.</summary>
    public static IReadOnlyList<Note> Of(Model model, RunOutcome outcome)
    {
        IEnumerable<Note> methods = model.Triangles.Select(triangle => new Note("method", MethodOf(triangle)));
        IEnumerable<Note> bookings = model.Triangles.Where(triangle => triangle.Options.Booked is not null).Select(Booking);
        IEnumerable<Note> tests = model.Triangles.Select(CalendarTest).OfType<Note>();
        IEnumerable<Note> effects = model.Triangles.Select(ChoiceEffects.Of).OfType<string>().Select(text => new Note("effect", text));
        return [.. methods, .. effects, .. bookings, .. tests, .. outcome.Redraws.Where(redraw => redraw.Trials > 0).Select(Redrawn)];
    }

    private static string MethodOf(TriangleInput input)
    {
        ReservingOptions options = input.Options;
        return options.Method == ReservingMethod.Mack
            ? $"{input.Name}: simulation of Mack's model (Mack 1993, 1999); factors drawn given the observed triangle (conditional "
                + "resampling, Buchwalder, Bühlmann, Merz & Wüthrich 2006), payments step by step with the conditional mean and "
                + $"variance; {ProcessOf(options)} process error; {RatiosOf(options)}{TailOf(options)}."
            : $"{input.Name}: residual bootstrap of the over-dispersed Poisson model (England & Verrall 1999, 2002); "
                + $"{ProcessOf(options)} process error; {ScaleOf(options)}; residuals that are zero by construction "
                + $"{(options.KeepZeroResiduals ? "kept" : "left out")}; residuals {(options.CentreResiduals ? "centred" : "not centred")}; "
                + $"{RatiosOf(options)}{TailOf(options)}.";
    }

    private static string ProcessOf(ReservingOptions options) => options.Process switch
    {
        ProcessError.OverDispersedPoisson => "over-dispersed Poisson",
        ProcessError.Lognormal => "lognormal",
        _ => "gamma",
    };

    private static string ScaleOf(ReservingOptions options) =>
        options.Scale == ScaleForm.ByDevelopment ? "one scale per development period" : "one scale for all cells";

    private static string RatiosOf(ReservingOptions options)
    {
        string average = options.Average == LinkRatioAverage.Simple ? "simple" : "volume-weighted";
        string periods = options.LastPeriods is { } last ? $" of the latest {last} calendar periods" : "";
        string excluded = options.Excluded.Count > 0 ? $", {options.Excluded.Count} excluded" : "";
        return $"{average} link ratios{periods}{excluded}";
    }

    private static string TailOf(ReservingOptions options) => options.Tail switch
    {
        null => "; no tail",
        { Factor: { } factor } tail => $"; tail factor {factor} (sd {tail.Sd}) paid over {Periods(tail.Periods)}",
        { } tail => $"; tail factor by exponential decay, paid over {Periods(tail.Periods)}",
    };

    private static string Periods(int periods) => periods == 1 ? "1 period" : $"{periods} periods";

    private static Note Booking(TriangleInput input)
    {
        BookedEstimate booked = input.Options.Booked!;
        string form = booked.Form == BookedForm.Shift ? "shift" : "scaling";
        return new Note("booked", $"{input.Name}: moved by {form} to the booked best estimate {booked.BestEstimate:#,##0.###}.", booked.BestEstimate);
    }

    private static Note? CalendarTest(TriangleInput input)
    {
        if (ReservingFit.Of(input.Triangle, input.Options, []) is not { } fit)
        {
            return null;
        }

        CalendarYearTest test = CalendarYearTest.Of(fit.ChainLadder.Ratios);
        string verdict = test.IsRejected
            ? "outside: calendar periods push the link ratios, and the figures do not know it"
            : "inside: no calendar year effect is seen";
        return new Note(
            "calendar-year-effect",
            $"{input.Name}: calendar year test (Mack 1994): Z = {test.Statistic:0}, about 95 % range {test.Low:0.0} to {test.High:0.0}; {verdict}.",
            test.Statistic);
    }

    private static Note Redrawn(RedrawCount redraw) => new(
        "redrawn", $"{redraw.Component}: drawn again because a pseudo-triangle gave no factor in {redraw.Trials:N0} trials.", redraw.Trials);
}
