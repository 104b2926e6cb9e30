namespace Swarm.Engine.Reserving.Simulation;

/// <summary>The columns of a triangle, in the order in which its kernel writes them.</summary>
/// <param name="Shape">The triangle's shape.</param>
internal sealed record RunOffOutputs(RunOffShape Shape)
{
    /// <summary>All that is still to be paid.</summary>
    public const int Unpaid = 0;

    /// <summary>Its conditional mean, given the resampled factors: parameter error without process error.</summary>
    public const int Expected = 1;

    /// <summary>What is still to be paid of an origin.</summary>
    public static int Origin(int origin) => 2 + origin;

    /// <summary>What is paid in a future calendar period (from 0).</summary>
    public int Calendar(int period) => 2 + Shape.Origins + period;

    /// <summary>Number of columns.</summary>
    public int Count => 2 + Shape.Origins + Shape.FuturePeriods;
}
