using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>A triangle as a component: unpaid claims in total, by origin and by calendar period.</summary>
internal sealed class TriangleComponent : Component
{
    private readonly RunOffShape _shape;
    private readonly TriangleNames _names;
    private readonly Func<LaneWidth, ComponentKernel> _createKernel;

    private TriangleComponent(string name, Triangle triangle, RunOffShape shape, Func<LaneWidth, ComponentKernel> createKernel)
        : base(name)
    {
        _shape = shape;
        _names = new TriangleNames(name, triangle, shape);
        _createKernel = createKernel;
        Outputs = _names.All;
    }

    /// <inheritdoc/>
    public override IReadOnlyList<string> Outputs { get; }

    /// <inheritdoc/>
    public override IEnumerable<(string Name, int Step, string? Output)> Stepped(int horizon)
    {
        for (int step = 1; step <= horizon; step++)
        {
            string? output = step <= _shape.FuturePeriods ? _names.Paid(_names.FuturePeriod(step)) : null;
            yield return (_names.PaidByStep, step, output);
        }
    }

    /// <inheritdoc/>
    public override ComponentKernel CreateKernel(LaneWidth width) => _createKernel(width);

    /// <summary>The bootstrap of a triangle.</summary>
    public static TriangleComponent OfBootstrap(string name, Triangle triangle, BootstrapInput input) =>
        new(name, triangle, input.Pseudo.Shape, width => width switch
        {
            LaneWidth.Vector512 => new BootstrapKernel<Lanes512>(input),
            LaneWidth.Vector256 => new BootstrapKernel<Lanes256>(input),
            LaneWidth.Vector128 => new BootstrapKernel<Lanes128>(input),
            _ => new BootstrapKernel<Lanes64>(input),
        });

    /// <summary>Mack's model of a triangle.</summary>
    public static TriangleComponent OfMack(string name, Triangle triangle, MackInput input) =>
        new(name, triangle, input.Shape, width => width switch
        {
            LaneWidth.Vector512 => new MackKernel<Lanes512>(input),
            LaneWidth.Vector256 => new MackKernel<Lanes256>(input),
            LaneWidth.Vector128 => new MackKernel<Lanes128>(input),
            _ => new MackKernel<Lanes64>(input),
        });
}
