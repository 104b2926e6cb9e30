using System.Runtime.CompilerServices;
using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Draws the amount of one future cell from its conditional mean m: gamma or over-dispersed Poisson with variance scale times
/// |m|. A negative mean gives minus the amount of its absolute value.
/// </summary>
internal sealed unsafe class FutureCellKernel<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    private readonly ProcessError _process;
    private readonly int _trials;
    private readonly ColumnMemory _columns;
    private readonly int[] _pending;

    public FutureCellKernel(ProcessError process, int trials)
    {
        _process = process;
        _trials = trials;
        _columns = new ColumnMemory(2 + GammaKernel<V>.ScratchColumns, trials);
        _pending = new int[trials];
    }

    /// <summary>Replaces conditional means by amounts.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public void Draw(in ItemStream numbers, double scale, double* cell)
    {
        double* size = _columns[0];
        double* unit = _columns[1];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Abs(V.Load(cell + t)) / V.Create(scale), size + t);
        }

        fixed (int* pending = _pending)
        {
            if (_process == ProcessError.Gamma)
            {
                GammaKernel<V>.Fill(numbers, size, unit, _trials, _columns[2], pending);
            }
            else
            {
                PoissonKernel<V>.Fill(numbers, size, unit, _trials);
            }
        }

        for (int t = 0; t < _trials; t += V.Count)
        {
            V sign = V.Load(cell + t) & V.Create(-0.0);
            V.Store((V.Load(unit + t) * V.Create(scale)) | sign, cell + t);
        }
    }

    public void Dispose() => _columns.Dispose();
}
