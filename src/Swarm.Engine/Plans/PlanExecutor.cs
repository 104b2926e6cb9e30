using System.Runtime.InteropServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Plans;

/// <summary>Runs a plan on one thread, tile by tile. All memory is taken at construction; running takes none.</summary>
internal abstract unsafe class PlanExecutor : IDisposable
{
    /// <summary>
    /// Trials of a tile: columns of 8 KiB, of which the few in use at a time fit the first cache; long enough that choosing a
    /// kernel costs little. Tiles do not show in the bits.
    /// </summary>
    public const int TileTrials = 1024;

    private const int CacheLine = 64;

    private readonly double* _columns;
    private readonly double* _constants;
    private readonly int _trialsPerTile;

    private protected PlanExecutor(Plan plan, LaneWidth width, int trialsPerTile)
    {
        Plan = plan;
        Width = width;
        _trialsPerTile = trialsPerTile;
        _columns = Allocate((nuint)plan.Columns * (nuint)trialsPerTile);
        _constants = Allocate((nuint)plan.Constants.Length * Edition.VirtualLanes);
        for (int i = 0; i < plan.Constants.Length; i++)
        {
            new Span<double>(_constants + (i * Edition.VirtualLanes), Edition.VirtualLanes).Fill(plan.Constants[i]);
        }

        Kernels = [.. plan.Components.Select(component => component.Component.CreateKernel(width))];
    }

    /// <summary>Trials of the run, counted over its components, for which one had to draw again.</summary>
    public IReadOnlyList<ComponentKernel> Kernels { get; }

    private protected Plan Plan { get; }

    private protected LaneWidth Width { get; }

    /// <summary>An executor at a vector width.</summary>
    public static PlanExecutor Create(Plan plan, LaneWidth width, int trialsPerTile = TileTrials) => width switch
    {
        LaneWidth.Vector512 => new PlanExecutor<Lanes512>(plan, width, trialsPerTile),
        LaneWidth.Vector256 => new PlanExecutor<Lanes256>(plan, width, trialsPerTile),
        LaneWidth.Vector128 => new PlanExecutor<Lanes128>(plan, width, trialsPerTile),
        _ => new PlanExecutor<Lanes64>(plan, width, trialsPerTile),
    };

    /// <summary>Computes a tile.</summary>
    /// <param name="firstTrial">Its first trial, a multiple of 16.</param>
    /// <param name="live">How many of its trials belong to the run.</param>
    /// <param name="outcomes">Where each outcome's values go: outcome i at <c>i * stride</c>.</param>
    /// <param name="stride">Distance between outcomes.</param>
    /// <returns>The fault of the lowest trial, or null.</returns>
    public abstract TileFault? RunTile(long firstTrial, int live, double* outcomes, int stride);

    /// <summary>Values of a column after a tile has run.</summary>
    public ReadOnlySpan<double> Column(int register) => register < 0
        ? new ReadOnlySpan<double>(_constants + (~register * Edition.VirtualLanes), Math.Min(Edition.VirtualLanes, _trialsPerTile))
        : new ReadOnlySpan<double>(_columns + ((nint)register * _trialsPerTile), _trialsPerTile);

    /// <inheritdoc/>
    public void Dispose()
    {
        foreach (ComponentKernel kernel in Kernels)
        {
            kernel.Dispose();
        }

        NativeMemory.AlignedFree(_columns);
        NativeMemory.AlignedFree(_constants);
        GC.SuppressFinalize(this);
    }

    private protected int TrialsPerTile => _trialsPerTile;

    private protected double* Target(int column) => _columns + ((nint)column * _trialsPerTile);

    private protected Operand Operand(int register) => register switch
    {
        Operation.None => default,
        < 0 => new Operand(_constants + (~register * Edition.VirtualLanes), true),
        _ => new Operand(Target(register), false),
    };

    private static double* Allocate(nuint doubles) =>
        (double*)NativeMemory.AlignedAlloc(Math.Max(doubles, 1) * sizeof(double), CacheLine);
}

/// <summary>The executor at one width.</summary>
internal sealed unsafe class PlanExecutor<V>(Plan plan, LaneWidth width, int trialsPerTile) : PlanExecutor(plan, width, trialsPerTile)
    where V : unmanaged, ILanes<V>
{
    public override TileFault? RunTile(long firstTrial, int live, double* outcomes, int stride)
    {
        TileFault? fault = null;
        Operation[] operations = Plan.Operations;
        for (int i = 0; i < operations.Length; i++)
        {
            ref readonly Operation operation = ref operations[i];
            switch (operation.Code)
            {
                case OpCode.Draw:
                    Draw(operation, firstTrial);
                    break;
                case OpCode.Component:
                    RunComponent(operation.A, firstTrial, live);
                    break;
                case OpCode.Emit:
                    ColumnKernels<V>.Copy(Operand(operation.A), outcomes + ((nint)operation.B * stride), TrialsPerTile);
                    break;
                case OpCode.CheckFinite:
                    fault = TileFault.First(fault, Check(operation, i, firstTrial, live));
                    break;
                default:
                    ColumnOperations<V>.Apply(
                        operation.Code,
                        Operand(operation.A),
                        Operand(operation.B),
                        Operand(operation.C),
                        Target(operation.Target),
                        TrialsPerTile);
                    break;
            }
        }

        return fault;
    }

    private void Draw(in Operation operation, long firstTrial)
    {
        PlanDraw draw = Plan.Draws[operation.A];
        draw.Distribution.Fill(
            new DrawSlice(draw.Key, firstTrial, draw.Step, Width),
            new Span<double>(Target(operation.Target), TrialsPerTile));
    }

    private void RunComponent(int index, long firstTrial, int live)
    {
        int[] targets = Plan.Components[index].Targets;
        double** outputs = stackalloc double*[targets.Length];
        for (int i = 0; i < targets.Length; i++)
        {
            outputs[i] = targets[i] == Operation.None ? null : Target(targets[i]);
        }

        Kernels[index].Evaluate(firstTrial, TrialsPerTile, live, outputs);
    }

    private TileFault? Check(in Operation operation, int index, long firstTrial, int live)
    {
        Operand? condition = operation.B == Operation.None ? null : Operand(operation.B);
        int trial = ColumnKernels<V>.FirstFault(Operand(operation.A), condition, TrialsPerTile);
        return trial >= 0 && trial < live ? new TileFault(firstTrial + trial, index) : null;
    }
}
