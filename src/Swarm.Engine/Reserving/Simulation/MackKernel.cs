using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Simulates Mack's model (Mack 1993) across trials: development factors from their sampling distribution given the observed
/// amounts, period by period independent (the conditional resampling of Buchwalder, Bühlmann, Merz &amp; Wüthrich 2006), here
/// lognormal; then each period's amount with conditional mean f C and variance sigma^2 C.
/// </summary>
internal sealed unsafe class MackKernel<V> : ComponentKernel
    where V : unmanaged, ILanes<V>
{
    private const int Run = 128;

    private readonly MackInput _input;
    private readonly RunOffSums<V> _sums;
    private readonly MackStep<V> _step;
    private readonly ColumnMemory _factors;
    private readonly ColumnMemory _scratch = new(4, Run);

    public MackKernel(MackInput input)
    {
        _input = input;
        _sums = new RunOffSums<V>(input.Shape, input.Booking, Run);
        _step = new MackStep<V>(input.Process, input.Alpha, Run);
        _factors = new ColumnMemory(input.Factors.Length, Run);
    }

    private double* Cumulative => _scratch[0];

    private double* Before => _scratch[1];

    private double* Expected => _scratch[2];

    private double* Cell => _scratch[3];

    public override void Evaluate(long firstTrial, int trials, int live, double** outputs)
    {
        ulong* factorKeys = stackalloc ulong[2 * Philox4x32.KeyWords];
        ulong* amountKeys = factorKeys + Philox4x32.KeyWords;
        Philox4x32.ExpandKey(_input.FactorKey, factorKeys);
        Philox4x32.ExpandKey(_input.AmountKey, amountKeys);
        for (int start = 0; start < trials; start += Run)
        {
            DrawFactors((nint)factorKeys, firstTrial + start);
            _sums.Clear();
            RunOff((nint)amountKeys, firstTrial + start);
            _sums.Write(outputs, start, Math.Min(Run, trials - start));
        }
    }

    protected override void Release()
    {
        _sums.Dispose();
        _step.Dispose();
        _factors.Dispose();
        _scratch.Dispose();
    }

    private void DrawFactors(nint keys, long firstTrial)
    {
        for (int k = 0; k < _input.Factors.Length; k++)
        {
            var numbers = new ItemStream(keys, firstTrial, 0, k);
            _step.DrawFactor(numbers, _input.Factors[k], _input.FactorErrors[k], _factors[k]);
        }
    }

    private void RunOff(nint keys, long firstTrial)
    {
        long item = 0;
        for (int i = 0; i < _input.Shape.Origins; i++)
        {
            if (_input.Latest[i] == 0)
            {
                // Nothing grows out of nothing, and a mean of 0 has no coefficient of variation; the numbers are skipped all the same.
                item += Math.Max(0, _input.Factors.Length - _input.Shape.Known[i] + 1);
                continue;
            }

            new Span<double>(Cumulative, Run).Fill(_input.Latest[i]);
            new Span<double>(Expected, Run).Fill(_input.Latest[i]);
            for (int k = _input.Shape.Known[i] - 1; k < _input.Factors.Length; k++, item++)
            {
                new Span<double>(Cumulative, Run).CopyTo(new Span<double>(Before, Run));
                _step.Advance(new ItemStream(keys, firstTrial, 0, item), _factors[k], _input.Sigmas[k], Cumulative);
                AddExpected(_factors[k]);
                AddAmounts(i, k);
            }
        }
    }

    private void AddExpected(double* factor)
    {
        for (int t = 0; t < Run; t += V.Count)
        {
            V before = V.Load(Expected + t);
            V after = before * V.Load(factor + t);
            V.Store(after, Expected + t);
            V.Store(after - before, Cell + t);
        }

        _sums.AddExpected(Cell);
    }

    /// <summary>The period's amount; the tail's is spread over its payment periods.</summary>
    private void AddAmounts(int origin, int development)
    {
        int next = development + 1;
        if (next < _input.Shape.Developments)
        {
            AddShare(origin, next, 1);
            return;
        }

        for (int k = 0; k < _input.TailShares.Length; k++)
        {
            AddShare(origin, next + k, _input.TailShares[k]);
        }
    }

    private void AddShare(int origin, int development, double share)
    {
        V part = V.Create(share);
        for (int t = 0; t < Run; t += V.Count)
        {
            V.Store((V.Load(Cumulative + t) - V.Load(Before + t)) * part, Cell + t);
        }

        _sums.Add(origin, development, Cell);
    }
}
