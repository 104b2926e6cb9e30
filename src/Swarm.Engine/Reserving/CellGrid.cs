namespace Swarm.Engine.Reserving;

/// <summary>Cells by origin and development, both from 0, without holes.</summary>
internal sealed class CellGrid
{
    private readonly List<TriangleCell>[] _rows;
    private readonly OriginPeriod _first;

    private CellGrid(OriginPeriod first, List<TriangleCell>[] rows)
    {
        _first = first;
        _rows = rows;
    }

    /// <summary>Number of origins.</summary>
    public int Origins => _rows.Length;

    /// <summary>Months of a period.</summary>
    public int Months => _first.Months;

    /// <summary>Labels of the origins.</summary>
    public IReadOnlyList<string> Labels => [.. Enumerable.Range(0, Origins).Select(i => Period(i).ToString())];

    /// <summary>The origin, or calendar, period of a number from 0.</summary>
    public OriginPeriod Period(int number) => new(_first.Number + number, _first.Months);

    /// <summary>The cells of an origin, first development first.</summary>
    public IReadOnlyList<TriangleCell> Row(int origin) => _rows[origin];

    /// <summary>The increments of every origin.</summary>
    public double[][] Increments(TriangleAmounts amounts) =>
    [
        .. _rows.Select(row => row
            .Select((cell, j) => amounts == TriangleAmounts.Incremental || j == 0 ? cell.Amount : cell.Amount - row[j - 1].Amount)
            .ToArray()),
    ];

    /// <summary>The grid, or null after an error: a cell given twice, a gap, too many periods.</summary>
    public static CellGrid? Of(IReadOnlyList<TriangleCell> cells, int monthsPerAge, TriangleFaults faults)
    {
        OriginPeriod first = cells.MinBy(cell => cell.Origin.Number)!.Origin;
        if (IsTooLarge(cells, first, monthsPerAge, faults))
        {
            return null;
        }

        int origins = cells.Max(cell => cell.Origin.Number) - first.Number + 1;
        List<TriangleCell>[] rows = [.. Enumerable.Range(0, origins).Select(_ => new List<TriangleCell>())];
        foreach (TriangleCell cell in cells.OrderBy(cell => cell.Age))
        {
            rows[cell.Origin.Number - first.Number].Add(cell with { Age = cell.Age / monthsPerAge });
        }

        var grid = new CellGrid(first, rows);
        bool isWhole = true;
        for (int i = 0; i < origins; i++)
        {
            isWhole &= grid.HasOrigin(i, faults) && grid.IsRowWhole(i, faults);
        }

        return isWhole && !faults.HasLostCells ? grid : null;
    }

    private static bool IsTooLarge(
        IReadOnlyList<TriangleCell> cells, OriginPeriod first, int monthsPerAge, TriangleFaults faults)
    {
        TriangleCell? late = cells.FirstOrDefault(cell => cell.Origin.Number - first.Number >= TriangleBounds.Origins);
        if (late is not null)
        {
            faults.Error(
                late.Position, $"origin {late.Origin} is more than {TriangleBounds.Origins} periods after origin {first}",
                "check the label, or give fewer origins");
        }

        TriangleCell? old = cells.FirstOrDefault(cell => cell.Age / monthsPerAge > TriangleBounds.Developments);
        if (old is not null)
        {
            faults.Error(
                old.Position, $"development {old.Age} is beyond the {TriangleBounds.Developments} periods that a triangle may have",
                "check the development, or give fewer");
        }

        return late is not null || old is not null;
    }

    private bool HasOrigin(int origin, TriangleFaults faults)
    {
        if (_rows[origin].Count > 0 || faults.HasLostCells)
        {
            return _rows[origin].Count > 0;
        }

        int next = Array.FindIndex(_rows, origin, row => row.Count > 0);
        faults.Error(
            FirstInFile(_rows[next]).Position, $"there is no origin {Period(origin)} before origin {Period(next)}",
            "give a row for it; write 0 where nothing fell");
        return false;
    }

    private bool IsRowWhole(int origin, TriangleFaults faults)
    {
        bool isWhole = true;
        int expected = 1;
        TriangleCell? before = null;
        foreach (TriangleCell cell in _rows[origin])
        {
            if (cell.Age < expected)
            {
                isWhole = false;
                faults.Error(
                    cell.Position,
                    $"origin {Period(origin)}, development {cell.Age} stands twice; first on line {before!.Position.Line}",
                    "give each cell once");
                continue;
            }

            if (cell.Age > expected && !faults.HasLostCells)
            {
                isWhole = false;
                string gap = cell.Age == expected + 1 ? $"development {expected}" : $"developments {expected} to {cell.Age - 1}";
                faults.Error(
                    cell.Position, $"origin {Period(origin)} has development {cell.Age} but not {gap}",
                    "give every cell up to the latest; write 0 for an increment, or repeat the cumulative amount, where nothing fell");
            }

            before = cell;
            expected = cell.Age + 1;
        }

        return isWhole;
    }

    private static TriangleCell FirstInFile(List<TriangleCell> row) =>
        row.MinBy(cell => (cell.Position.Line, cell.Position.Column))!;
}
