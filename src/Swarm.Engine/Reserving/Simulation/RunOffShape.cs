namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Which cells of a triangle are known and which are to come, numbered for the kernels.</summary>
internal sealed class RunOffShape
{
    /// <summary>The shape of a triangle with a tail that is paid over some more periods.</summary>
    public RunOffShape(Triangle triangle, int tailPeriods)
    {
        Origins = triangle.Origins.Count;
        Developments = triangle.Developments;
        TailPeriods = tailPeriods;
        Known = [.. Enumerable.Range(0, Origins).Select(triangle.Known)];
        RowsAt = [.. Enumerable.Range(0, Developments).Select(j => Known.Count(known => known > j))];
        FuturePeriods = Developments + tailPeriods - Known.Min();
    }

    /// <summary>Number of origin periods.</summary>
    public int Origins { get; }

    /// <summary>Number of development periods of the triangle.</summary>
    public int Developments { get; }

    /// <summary>Number of periods after the last development in which the tail is paid.</summary>
    public int TailPeriods { get; }

    /// <summary>Known cells of each origin; never growing from one origin to the next.</summary>
    public int[] Known { get; }

    /// <summary>Origins known at each development: always the oldest ones.</summary>
    public int[] RowsAt { get; }

    /// <summary>Number of calendar periods in which something is still paid.</summary>
    public int FuturePeriods { get; }

    /// <summary>Calendar period, from 0, in which a future cell is paid.</summary>
    public int FuturePeriod(int origin, int development) => development - Known[origin];
}
