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
    private readonly ColumnMemory _scratch;

    public RunOffKernel(RunOffShape shape, ProcessInput input, int trials)
    {
        _shape = shape;
        _input = input;
        _trials = trials;
        _cells = new FutureCellKernel<V>(input.Process, trials);
        _scratch = new ColumnMemory(2, trials);
    }

    private double* Cumulative => _scratch[0];

    private double* Cell => _scratch[1];

    /// <summary>Evaluates one run-off a trial.</summary>
    /// <param name="processKeys">Round keys of the process error.</param>
    /// <param name="firstTrial">First trial.</param>
    /// <param name="pseudo">Amounts to date and factors.</param>
    /// <param name="tailExcess">Tail factor less 1, or null without tail.</param>
    /// <param name="sums">Receives the cells.</param>
    public void Evaluate(
        nint processKeys, long firstTrial, PseudoTriangleKernel<V> pseudo, double* tailExcess, RunOffSums<V> sums)
    {
        long item = 0;
        for (int i = 0; i < _shape.Origins; i++)
        {
            new Span<double>(pseudo.Latest(i), _trials).CopyTo(new Span<double>(Cumulative, _trials));
            for (int j = _shape.Known[i]; j < _shape.Developments; j++, item++)
            {
                Advance(pseudo.Factor(j - 1));
                AddCell(new ItemStream(processKeys, firstTrial, 0, item), i, j, sums);
            }

            for (int k = 0; k < _shape.TailPeriods; k++, item++)
            {
                TakeTail(tailExcess, _input.TailShares[k]);
                AddCell(new ItemStream(processKeys, firstTrial, 0, item), i, _shape.Developments + k, sums);
            }
        }
    }

    public void Dispose()
    {
        _cells.Dispose();
        _scratch.Dispose();
    }

    /// <summary>The next cell's conditional mean, and the cumulative amount after it.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private void Advance(double* factor)
    {
        double* cumulative = Cumulative;
        double* cell = Cell;
        for (int t = 0; t < _trials; t += V.Count)
        {
            V before = V.Load(cumulative + t);
            V after = before * V.Load(factor + t);
            V.Store(after, cumulative + t);
            V.Store(after - before, cell + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private void TakeTail(double* tailExcess, double share)
    {
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Load(Cumulative + t) * V.Load(tailExcess + t) * V.Create(share), Cell + t);
        }
    }

    private void AddCell(in ItemStream numbers, int origin, int development, RunOffSums<V> sums)
    {
        sums.AddExpected(Cell);
        _cells.Draw(numbers, _input.Scales[Math.Min(development, _input.Scales.Length - 1)], Cell);
        sums.Add(origin, development, Cell);
    }
}
