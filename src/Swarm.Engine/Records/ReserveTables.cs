using Swarm.Engine.Plans;
using Swarm.Engine.Reserving;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Records;

/// <summary>Tables by origin: what needs no simulation, and what the simulation makes of it.</summary>
internal static class ReserveTables
{
    private const string Total = "total";

    /// <summary>Paid to date, ultimate and reserve by the chain ladder, with the method's closed-form errors where it has them.</summary>
    public static ReportTable Reserves(string name, ReservingFit fit)
    {
        ChainLadder ladder = fit.ChainLadder;
        IReadOnlyList<string> origins = ladder.Triangle.Origins;
        int[] rows = [.. Enumerable.Range(0, origins.Count)];
        List<ReportColumn> columns =
        [
            ReportColumn.OfLabels("origin", [.. origins, Total]),
            Money("to date", WithTotal(rows.Select(ladder.Triangle.Latest))),
            Money("ultimate", WithTotal(rows.Select(ladder.Ultimate))),
            Money("reserve", [.. rows.Select(ladder.Reserve), ladder.TotalReserve]),
        ];
        if (ErrorsOf(fit, rows) is { } errors)
        {
            columns.Add(Money("process", [.. errors.Select(error => error.Process)]));
            columns.Add(Money("parameter", [.. errors.Select(error => error.Parameter)]));
            columns.Add(Money("error", [.. errors.Select(error => error.StandardError)]));
        }

        return new ReportTable("reserves", name, Title(columns.Count), columns);
    }

    private static string Title(int columns) =>
        columns > 4 ? "chain ladder by origin, with prediction errors in closed form" : "chain ladder by origin";

    /// <summary>The simulated means beside the reserves that they are to meet; null where the run does not report the total.</summary>
    public static ReportTable? Comparison(string name, ReservingFit fit, RunOutcome outcome)
    {
        List<(string Label, double Reserve, Estimate Mean)> rows = [];
        IReadOnlyList<string> origins = fit.ChainLadder.Triangle.Origins;
        for (int i = 0; i < origins.Count; i++)
        {
            if (MeanOf($"{name}.unpaid.{origins[i]}", outcome) is { } mean)
            {
                rows.Add((origins[i], Booked(fit, fit.ChainLadder.Reserve(i)), mean));
            }
        }

        if (MeanOf($"{name}.unpaid", outcome) is not { } total)
        {
            return null;
        }

        rows.Add((Total, Booked(fit, fit.ChainLadder.TotalReserve), total));
        bool isBooked = fit.ChainLadder.Options.Booked is not null;
        return new ReportTable(
            "comparison",
            name,
            isBooked ? "simulated means beside the booked reserves" : "simulated means beside the chain ladder",
            [
                ReportColumn.OfLabels("origin", [.. rows.Select(row => row.Label)]),
                Money(isBooked ? "booked" : "chain ladder", [.. rows.Select(row => row.Reserve)]),
                Money("simulated mean", [.. rows.Select(row => row.Mean.Value)]),
                Money("difference", [.. rows.Select(row => row.Mean.Value - row.Reserve)]),
                Money("its error", [.. rows.Select(row => row.Mean.StandardError ?? double.NaN)]),
            ]);
    }

    private static double Booked(ReservingFit fit, double reserve) =>
        (fit.Booking.Scale * reserve) + (fit.Booking.Shift == 0 ? 0 : fit.Booking.ShiftOf(reserve));

    private static PredictionError[]? ErrorsOf(ReservingFit fit, int[] origins)
    {
        if (fit.Mack is { } mack)
        {
            return [.. origins.Select(mack.Origin), mack.Total];
        }

        return fit.Odp is { } odp && OdpPredictionErrors.Of(odp) is { } errors ? [.. origins.Select(errors.Origin), errors.Total] : null;
    }

    private static Estimate? MeanOf(string outcome, RunOutcome run) =>
        run.Results.FirstOrDefault(result => result.Result.Request.Name == outcome) is { } found
            ? Figures.Of(found.Result, ErrorMethod.ClosedForm).Mean
            : null;

    private static double[] WithTotal(IEnumerable<double> values)
    {
        List<double> column = [.. values];
        double sum = 0;
        foreach (double value in column)
        {
            sum += value;
        }

        column.Add(sum);
        return [.. column];
    }

    private static ReportColumn Money(string name, IReadOnlyList<double> values) => ReportColumn.OfNumbers(name, ColumnKind.Money, values);
}
