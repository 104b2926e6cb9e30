namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Names of a triangle's quantities.</summary>
/// <param name="name">Name of the triangle in the model.</param>
/// <param name="triangle">The triangle.</param>
/// <param name="shape">Its shape with the tail.</param>
internal sealed class TriangleNames(string name, Triangle triangle, RunOffShape shape)
{
    private readonly string _latest = PeriodLabel.LatestCalendar(triangle);

    /// <summary>Conditional mean of what is unpaid.</summary>
    public string Expected => $"{name}.expected";

    /// <summary>Labels of the calendar periods in which something is still paid.</summary>
    public IReadOnlyList<string> FuturePeriods => [.. Enumerable.Range(1, shape.FuturePeriods).Select(FuturePeriod)];

    /// <summary>All, in the order of <see cref="RunOffOutputs"/>.</summary>
    public IReadOnlyList<string> All =>
        [$"{name}.unpaid", Expected, .. triangle.Origins.Select(Unpaid), .. FuturePeriods.Select(Paid)];

    /// <summary>What is unpaid of an origin.</summary>
    public string Unpaid(string origin) => $"{name}.unpaid.{origin}";

    /// <summary>What is paid in a calendar period.</summary>
    public string Paid(string period) => $"{name}.paid.{period}";

    /// <summary>Name of the quantity with a step that is paid in the future.</summary>
    public string PaidByStep => $"{name}.paid";

    /// <summary>Label of a future calendar period, from 1.</summary>
    public string FuturePeriod(int number) => PeriodLabel.Add(_latest, number);
}
