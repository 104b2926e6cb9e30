namespace Swarm.Engine.Reserving;

/// <summary>Puts cells in their places and checks that they make a run-off triangle.</summary>
internal static class TriangleAssembly
{
    /// <summary>The triangle, or null after an error.</summary>
    public static Triangle? Of(IReadOnlyList<TriangleCell> cells, TriangleRequest request, TriangleFaults faults)
    {
        int? months = MonthsOf(cells, request, faults);
        int? monthsPerAge = months is { } m ? MonthsPerAge(cells, m, faults) : null;
        if (months is null || monthsPerAge is null)
        {
            return null;
        }

        var grid = CellGrid.Of(cells, monthsPerAge.Value, faults);
        if (grid is null)
        {
            return null;
        }

        RunOffCheck.Check(grid, request.AsOf, faults);
        return faults.HasErrors ? null : new Triangle(grid.Labels, grid.Increments(request.Amounts), months.Value);
    }

    private static int? MonthsOf(IReadOnlyList<TriangleCell> cells, TriangleRequest request, TriangleFaults faults)
    {
        int months = request.MonthsPerPeriod ?? cells[0].Origin.Months;
        TriangleCell? odd = cells.FirstOrDefault(cell => cell.Origin.Months != months);
        if (odd is null)
        {
            return months;
        }

        (string period, string wanted, string other) =
            months == OriginPeriod.Yearly ? ("year", "2017", "quarter") : ("quarter", "2017Q3", "year");
        faults.Error(
            odd.Position, $"origin {odd.Origin} is not a {period}",
            $"write origins as {wanted}, or period: {other} in the model if all are {other}s");
        return null;
    }

    /// <summary>How many units of development make a period: 1 if the first is 1, else the months of a period.</summary>
    private static int? MonthsPerAge(IReadOnlyList<TriangleCell> cells, int months, TriangleFaults faults)
    {
        if (cells.Any(cell => cell.Age == 1))
        {
            return 1;
        }

        TriangleCell? odd = cells.FirstOrDefault(cell => cell.Age % months != 0);
        if (odd is null)
        {
            return months;
        }

        faults.Error(
            odd.Position, $"development {odd.Age} is neither a number of periods counted from 1 nor a multiple of {months} months",
            $"give the age at the period's end: 1, 2, 3 or {months}, {2 * months}, {3 * months}");
        return null;
    }
}
