namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Names of a triangle's quantities, in the order of <see cref="RunOffOutputs"/>.</summary>
internal static class TriangleNames
{
    /// <summary><c>name.unpaid</c>, <c>name.expected</c>, <c>name.unpaid.ORIGIN</c>, <c>name.paid.PERIOD</c>.</summary>
    public static IReadOnlyList<string> Of(string name, Triangle triangle, RunOffShape shape)
    {
        string latest = PeriodLabel.LatestCalendar(triangle);
        return
        [
            $"{name}.unpaid",
            $"{name}.expected",
            .. triangle.Origins.Select(origin => $"{name}.unpaid.{origin}"),
            .. Enumerable.Range(1, shape.FuturePeriods).Select(period => $"{name}.paid.{PeriodLabel.Add(latest, period)}"),
        ];
    }
}
