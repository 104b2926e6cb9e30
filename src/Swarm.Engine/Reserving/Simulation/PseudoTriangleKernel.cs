using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// Resamples residuals into pseudo-triangles, one a trial, and fits development factors to each. Cell by cell down the
/// development periods, so that only the running cumulative amounts of each origin stay in memory.
/// </summary>
internal sealed unsafe class PseudoTriangleKernel<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    private const int CellsPerCounter = 4;

    private readonly PseudoTriangleInput _input;
    private readonly int _trials;
    private readonly ColumnMemory _cumulative;
    private readonly ColumnMemory _factors;
    private readonly ColumnMemory _scratch;

    public PseudoTriangleKernel(PseudoTriangleInput input, int trials)
    {
        _input = input;
        _trials = trials;
        _cumulative = new ColumnMemory(input.Shape.Origins, trials);
        _factors = new ColumnMemory(input.Shape.Developments, trials);
        _scratch = new ColumnMemory(CellsPerCounter + 4, trials);
    }

    private double* Residuals => _scratch[CellsPerCounter];

    private double* Numerator => _scratch[CellsPerCounter + 1];

    private double* Denominator => _scratch[CellsPerCounter + 2];

    /// <summary>All bits set where a trial's pseudo-triangle gives no factor for some development.</summary>
    public double* Failed => _scratch[CellsPerCounter + 3];

    /// <summary>Each trial's pseudo amount to date of an origin.</summary>
    public double* Latest(int origin) => _cumulative[origin];

    /// <summary>Each trial's factor from a development to the next.</summary>
    public double* Factor(int development) => _factors[development];

    /// <summary>Makes and fits one pseudo-triangle a trial.</summary>
    public void Evaluate(nint roundKeys, long firstTrial, int attempt)
    {
        int cell = 0;
        Fill(Failed, 0);
        for (int j = 0; j < _input.Shape.Developments; j++)
        {
            Fill(Numerator, 0);
            Fill(Denominator, 0);
            for (int i = 0; i < _input.Shape.RowsAt[j]; i++, cell++)
            {
                if (cell % CellsPerCounter == 0)
                {
                    DrawPicks(new ItemStream(roundKeys, firstTrial, 0, cell / CellsPerCounter), attempt);
                }

                LookUp(_scratch[cell % CellsPerCounter]);
                Accumulate(i, j, cell);
            }

            if (j > 0)
            {
                FitFactor(j - 1);
            }
        }
    }

    /// <summary>Takes over another attempt's pseudo-triangle for the trials whose own failed.</summary>
    public void ReplaceFailed(PseudoTriangleKernel<V> other)
    {
        for (int i = 0; i < _input.Shape.Origins; i++)
        {
            Replace(_cumulative[i], other._cumulative[i]);
        }

        for (int j = 0; j < _input.Shape.Developments - 1; j++)
        {
            Replace(_factors[j], other._factors[j]);
        }

        Replace(Failed, other.Failed);
    }

    public void Dispose()
    {
        _cumulative.Dispose();
        _factors.Dispose();
        _scratch.Dispose();
    }

    /// <summary>Four picks from the pool a trial, as integers in the scratch columns.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void DrawPicks(ItemStream numbers, int attempt)
    {
        V size = V.CreateBits((ulong)_input.Pool.Length);
        for (int t = 0; t < _trials; t += V.Count)
        {
            V index = V.AddIntegers(V.CreateBits((ulong)(numbers.FirstTrial + t)), V.Iota);
            numbers.Generate(index, attempt, out V c0, out V c1, out V c2, out V c3);
            V.Store(Uniform.Below(c0, size), _scratch[0] + t);
            V.Store(Uniform.Below(c1, size), _scratch[1] + t);
            V.Store(Uniform.Below(c2, size), _scratch[2] + t);
            V.Store(Uniform.Below(c3, size), _scratch[3] + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void LookUp(double* picks)
    {
        double* residuals = Residuals;
        long* index = (long*)picks;
        fixed (double* pool = _input.Pool)
        {
            for (int t = 0; t < _trials; t += 4)
            {
                residuals[t] = pool[index[t]];
                residuals[t + 1] = pool[index[t + 1]];
                residuals[t + 2] = pool[index[t + 2]];
                residuals[t + 3] = pool[index[t + 3]];
            }
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Accumulate(int origin, int development, int cell)
    {
        double* cumulative = _cumulative[origin];
        V mean = V.Create(_input.Means[cell]);
        V spread = V.Create(_input.Spreads[cell]);
        if (development == 0)
        {
            for (int t = 0; t < _trials; t += V.Count)
            {
                V.Store(V.FusedMultiplyAdd(spread, V.Load(Residuals + t), mean), cumulative + t);
            }

            return;
        }

        V weight = V.Create(_input.Weights[cell]);
        bool isSimple = _input.Average == LinkRatioAverage.Simple;
        double* numerator = Numerator;
        double* denominator = Denominator;
        for (int t = 0; t < _trials; t += V.Count)
        {
            V before = V.Load(cumulative + t);
            V after = before + V.FusedMultiplyAdd(spread, V.Load(Residuals + t), mean);
            V.Store(after, cumulative + t);
            V top = isSimple ? after / before : after;
            V bottom = isSimple ? V.Create(1) : before;
            V.Store(V.FusedMultiplyAdd(weight, top, V.Load(numerator + t)), numerator + t);
            V.Store(V.FusedMultiplyAdd(weight, bottom, V.Load(denominator + t)), denominator + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void FitFactor(int development)
    {
        double* factor = _factors[development];
        V zero = V.Create(0);
        for (int t = 0; t < _trials; t += V.Count)
        {
            V top = V.Load(Numerator + t);
            V bottom = V.Load(Denominator + t);
            V isFit = V.LessThan(zero, top) & V.LessThan(zero, bottom);
            V.Store(V.Load(Failed + t) | ~isFit, Failed + t);
            V.Store(top / bottom, factor + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Replace(double* column, double* other)
    {
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Select(V.Load(Failed + t), V.Load(other + t), V.Load(column + t)), column + t);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private void Fill(double* column, double value)
    {
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Create(value), column + t);
        }
    }
}
