using System.Runtime.CompilerServices;
using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Draws the amounts of future cells from their conditional means m: gamma or over-dispersed Poisson with variance scale times
/// |m|. A negative mean gives minus the amount of its absolute value. Cells are drawn a batch at a time, since what the gamma's
/// first pass leaves over fills whole vectors only across cells.
/// </summary>
internal sealed unsafe class FutureCellKernel<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    // Three columns a cell: a batch of 48 cells of 256 trials stays in the second cache.
    public const int MaxCells = 48;

    private readonly ProcessError _process;
    private readonly int _trials;
    private readonly ColumnMemory _means;
    private readonly ColumnMemory _sizes;
    private readonly ColumnMemory _amounts;
    private readonly GammaKernel<V> _gamma;

    public FutureCellKernel(ProcessError process, int trials)
    {
        _process = process;
        _trials = trials;
        _means = new ColumnMemory(MaxCells, trials);
        _sizes = new ColumnMemory(MaxCells, trials);
        _amounts = new ColumnMemory(MaxCells, trials);
        _gamma = new GammaKernel<V>(MaxCells, trials);
    }

    /// <summary>Conditional means of a cell of the batch, to be written by the caller.</summary>
    public double* Mean(int cell) => _means[cell];

    /// <summary>Amounts of a cell of the batch after <see cref="Draw"/>.</summary>
    public double* Amount(int cell) => _amounts[cell];

    /// <summary>Draws a batch.</summary>
    /// <param name="numbers">Which random numbers; the item is that of the first cell.</param>
    /// <param name="scales">Scale of each cell.</param>
    public void Draw(in ItemStream numbers, ReadOnlySpan<double> scales)
    {
        for (int cell = 0; cell < scales.Length; cell++)
        {
            Measure(cell, scales[cell]);
        }

        if (_process == ProcessError.Gamma)
        {
            _gamma.Fill(numbers, scales.Length, _sizes[0], _amounts[0]);
        }
        else
        {
            DrawCounts(numbers, scales.Length);
        }

        for (int cell = 0; cell < scales.Length; cell++)
        {
            Scale(cell, scales[cell]);
        }
    }

    public void Dispose()
    {
        _means.Dispose();
        _sizes.Dispose();
        _amounts.Dispose();
        _gamma.Dispose();
    }

    private void DrawCounts(in ItemStream numbers, int cells)
    {
        for (int cell = 0; cell < cells; cell++)
        {
            PoissonKernel<V>.Fill(numbers with { Item = numbers.Item + cell }, _sizes[cell], _amounts[cell], _trials);
        }
    }

    /// <summary>Size in units of the scale: the gamma's shape, the count's mean.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Measure(int cell, double scale)
    {
        double* mean = _means[cell];
        double* size = _sizes[cell];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Abs(V.Load(mean + t)) / V.Create(scale), size + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Scale(int cell, double scale)
    {
        double* mean = _means[cell];
        double* amount = _amounts[cell];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V sign = V.Load(mean + t) & V.Create(-0.0);
            V.Store((V.Load(amount + t) * V.Create(scale)) | sign, amount + t);
        }
    }
}
