namespace Swarm.Engine.Reserving;

/// <summary>Puts cells in their places and checks that they make a run-off triangle.</summary>
internal static class TriangleAssembly
{
    /// <summary>The triangle, or null after an error.</summary>
    public static Triangle? Of(IReadOnlyList<TriangleCell> cells, TriangleFormat format, TriangleFaults faults)
    {
        int? months = MonthsOf(cells, format, faults);
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

        RunOffCheck.Check(grid, format.AsOf, faults);
        return faults.HasErrors ? null : new Triangle(grid.Labels, grid.Increments(format.Amounts), months.Value);
    }

    private static int? MonthsOf(IReadOnlyList<TriangleCell> cells, TriangleFormat format, TriangleFaults faults)
    {
        int months = format.MonthsPerPeriod ?? cells[0].Origin.Months;
        TriangleCell? odd = cells.FirstOrDefault(cell => cell.Origin.Months != months);
        if (odd is null)
        {
            return months;
        }

        string wanted = months == OriginPeriod.Yearly ? "years (2017)" : "quarters (2017Q3)";
        faults.Error(
            odd.Position, $"origin {odd.Origin} stands among periods of {months} months", $"give all origins as {wanted}");
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
