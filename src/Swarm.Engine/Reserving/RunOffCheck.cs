namespace Swarm.Engine.Reserving;

/// <summary>Checks that every origin ends on the latest diagonal, or at the last development.</summary>
internal static class RunOffCheck
{
    /// <summary>Adds an error for each origin that ends elsewhere, and for a diagonal of another date than the given one.</summary>
    public static void Check(CellGrid grid, DateOnly? asOf, TriangleFaults faults)
    {
        int diagonal = LatestDiagonal(grid);
        int developments = Enumerable.Range(0, grid.Origins).Max(i => Math.Min(grid.Row(i).Count, diagonal - i + 1));
        for (int i = 0; i < grid.Origins; i++)
        {
            CheckOrigin(grid, i, diagonal, developments, faults);
        }

        if (asOf is { } date && !faults.HasErrors)
        {
            CheckDate(grid, diagonal, date, faults);
        }
    }

    /// <summary>Calendar period, from 0, on which most origins end; the later one of two.</summary>
    private static int LatestDiagonal(CellGrid grid) => Enumerable.Range(0, grid.Origins)
        .GroupBy(i => i + grid.Row(i).Count - 1)
        .OrderByDescending(ends => ends.Count())
        .ThenByDescending(ends => ends.Key)
        .First()
        .Key;

    private static void CheckOrigin(CellGrid grid, int origin, int diagonal, int developments, TriangleFaults faults)
    {
        IReadOnlyList<TriangleCell> row = grid.Row(origin);
        int expected = Math.Min(developments, diagonal - origin + 1);
        if (row.Count > expected)
        {
            TriangleCell beyond = row[Math.Max(0, expected)];
            faults.Error(
                beyond.Position,
                $"origin {grid.Period(origin)}, development {beyond.Age} lies beyond the latest diagonal, {grid.Period(diagonal)}",
                "leave it out, or give the other origins up to the same date");
        }
        else if (row.Count < expected)
        {
            string missing = expected == row.Count + 1 ? $"development {expected} is" : $"developments {row.Count + 1} to {expected} are";
            faults.Error(
                row[^1].Position,
                $"origin {grid.Period(origin)} ends at development {row.Count}, but the latest diagonal is {grid.Period(diagonal)}: {missing} missing",
                "give every origin up to the same date");
        }
    }

    private static void CheckDate(CellGrid grid, int diagonal, DateOnly date, TriangleFaults faults)
    {
        OriginPeriod latest = grid.Period(diagonal);
        TriangleCell youngest = grid.Row(grid.Origins - 1)[^1];
        var asked = OriginPeriod.Of(date, grid.Months);
        if (asked != latest)
        {
            faults.Error(
                youngest.Position, $"the latest diagonal is {latest}, but as_of {date:yyyy-MM-dd} lies in {asked}",
                "give the data up to that date, or mend as_of");
        }
        else if (date != latest.LastDay)
        {
            faults.Warning(
                youngest.Position, $"as_of {date:yyyy-MM-dd} is not the last day of {latest}",
                "every cell is taken as a whole period; a part of one on the latest diagonal would understate the reserve");
        }
    }
}
