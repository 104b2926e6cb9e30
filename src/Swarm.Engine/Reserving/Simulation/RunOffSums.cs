using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Adds future cells up by origin, by calendar period and in total, and hands the sums out.</summary>
internal sealed unsafe class RunOffSums<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    private readonly RunOffShape _shape;
    private readonly RunOffOutputs _outputs;
    private readonly BookingInput _booking;
    private readonly int _trials;
    private readonly ColumnMemory _sums;

    public RunOffSums(RunOffShape shape, BookingInput booking, int trials)
    {
        _shape = shape;
        _outputs = new RunOffOutputs(shape);
        _booking = booking;
        _trials = trials;
        _sums = new ColumnMemory(_outputs.Count, trials);
    }

    /// <summary>Sets all sums to zero.</summary>
    public void Clear()
    {
        for (int k = 0; k < _outputs.Count; k++)
        {
            new Span<double>(_sums[k], _trials).Clear();
        }
    }

    /// <summary>Adds the amounts of a future cell.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public void Add(int origin, int development, double* cell)
    {
        double* unpaid = _sums[RunOffOutputs.Unpaid];
        double* byOrigin = _sums[RunOffOutputs.Origin(origin)];
        double* byPeriod = _sums[_outputs.Calendar(_shape.FuturePeriod(origin, development))];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V amount = V.Load(cell + t);
            V.Store(V.Load(unpaid + t) + amount, unpaid + t);
            V.Store(V.Load(byOrigin + t) + amount, byOrigin + t);
            V.Store(V.Load(byPeriod + t) + amount, byPeriod + t);
        }
    }

    /// <summary>Adds the conditional means of a future cell.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public void AddExpected(double* cell)
    {
        double* sum = _sums[RunOffOutputs.Expected];
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Load(sum + t) + V.Load(cell + t), sum + t);
        }
    }

    /// <summary>Writes the columns that are used, moved to the booked estimate.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public void Write(double** outputs, int offset, int trials)
    {
        V scale = V.Create(_booking.Scale);
        for (int k = 0; k < _outputs.Count; k++)
        {
            double* target = outputs[k];
            if (target is null)
            {
                continue;
            }

            V shift = V.Create(_booking.Shifts[k]);
            for (int t = 0; t < trials; t += V.Count)
            {
                V.Store(V.FusedMultiplyAdd(scale, V.Load(_sums[k] + t), shift), target + offset + t);
            }
        }
    }

    public void Dispose() => _sums.Dispose();
}
