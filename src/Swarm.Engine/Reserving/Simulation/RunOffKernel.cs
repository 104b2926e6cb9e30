using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Runs each origin off to ultimate with a trial's own factors and draws the process error of every future cell.
/// </summary>
internal sealed unsafe class RunOffKernel<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    private readonly RunOffShape _shape;
    private readonly ProcessInput _input;
    private readonly int _trials;
    private readonly FutureCellKernel<V> _cells;
    private readonly ColumnMemory _cumulative;
    private readonly (int Origin, int Development)[] _batch = new (int, int)[FutureCellKernel<V>.MaxCells];
    private readonly double[] _scales = new double[FutureCellKernel<V>.MaxCells];
    private int _batched;
    private long _nextItem;

    public RunOffKernel(RunOffShape shape, ProcessInput input, int trials)
    {
        _shape = shape;
        _input = input;
        _trials = trials;
        _cells = new FutureCellKernel<V>(input.Process, trials);
        _cumulative = new ColumnMemory(1, trials);
    }

    /// <summary>Evaluates one run-off a trial.</summary>
    /// <param name="processKeys">Round keys of the process error.</param>
    /// <param name="firstTrial">First trial.</param>
    /// <param name="pseudo">Amounts to date and factors.</param>
    /// <param name="tailExcess">Tail factor less 1, or null without tail.</param>
    /// <param name="sums">Receives the cells.</param>
    public void Evaluate(
        nint processKeys, long firstTrial, PseudoTriangleKernel<V> pseudo, double* tailExcess, RunOffSums<V> sums)
    {
        var numbers = new ItemStream(processKeys, firstTrial, 0, 0);
        _nextItem = 0;
        for (int i = 0; i < _shape.Origins; i++)
        {
            new Span<double>(pseudo.Latest(i), _trials).CopyTo(new Span<double>(_cumulative[0], _trials));
            for (int j = _shape.Known[i]; j < _shape.Developments; j++)
            {
                Advance(pseudo.Factor(j - 1), _cells.Mean(_batched));
                Enter(numbers, i, j, sums);
            }

            for (int k = 0; k < _shape.TailPeriods; k++)
            {
                TakeTail(tailExcess, _input.TailShares[k], _cells.Mean(_batched));
                Enter(numbers, i, _shape.Developments + k, sums);
            }
        }

        Flush(numbers, sums);
    }

    public void Dispose()
    {
        _cells.Dispose();
        _cumulative.Dispose();
    }

    /// <summary>The next cell's conditional mean, and the cumulative amount after it.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Advance(double* factor, double* mean)
    {
        double* cumulative = _cumulative[0];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V before = V.Load(cumulative + t);
            V after = before * V.Load(factor + t);
            V.Store(after, cumulative + t);
            V.Store(after - before, mean + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void TakeTail(double* tailExcess, double share, double* mean)
    {
        double* cumulative = _cumulative[0];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Load(cumulative + t) * V.Load(tailExcess + t) * V.Create(share), mean + t);
        }
    }

    /// <summary>Takes the cell whose mean was written last into the batch.</summary>
    private void Enter(in ItemStream numbers, int origin, int development, RunOffSums<V> sums)
    {
        sums.AddExpected(_cells.Mean(_batched));
        _batch[_batched] = (origin, development);
        _scales[_batched] = _input.Scales[Math.Min(development, _input.Scales.Length - 1)];
        _batched++;
        if (_batched == FutureCellKernel<V>.MaxCells)
        {
            Flush(numbers, sums);
        }
    }

    private void Flush(in ItemStream numbers, RunOffSums<V> sums)
    {
        _cells.Draw(numbers with { Item = _nextItem }, _scales.AsSpan(0, _batched));
        for (int cell = 0; cell < _batched; cell++)
        {
            sums.Add(_batch[cell].Origin, _batch[cell].Development, _cells.Amount(cell));
        }

        _nextItem += _batched;
        _batched = 0;
    }
}
