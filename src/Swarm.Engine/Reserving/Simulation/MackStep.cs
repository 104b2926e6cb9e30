using System.Runtime.CompilerServices;
using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>The random parts of Mack's model: a factor's sampling error, and one period's process error.</summary>
internal sealed unsafe class MackStep<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    private readonly ProcessError _process;
    private readonly bool _isVolumeWeighted;
    private readonly int _trials;
    private readonly ColumnMemory _columns;
    private readonly GammaKernel<V> _gamma;

    /// <param name="process">Gamma or lognormal.</param>
    /// <param name="alpha">1 or 0: amounts vary as sigma^2 C^(2 - alpha).</param>
    /// <param name="trials">Trials of a column.</param>
    public MackStep(ProcessError process, int alpha, int trials)
    {
        _process = process;
        _isVolumeWeighted = alpha == 1;
        _trials = trials;
        _columns = new ColumnMemory(2, trials);
        _gamma = new GammaKernel<V>(1, trials);
    }

    /// <summary>Draws a factor with a mean and a standard error, lognormal so that it stays above 0.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public void DrawFactor(in ItemStream numbers, double mean, double error, double* target)
    {
        double logVariance = Elementary.Log1p(error / mean * (error / mean));
        V logMean = V.Create(Elementary.Log(mean) - (0.5 * logVariance));
        V logSd = V.Create(Math.Sqrt(logVariance));
        for (int t = 0; t < _trials; t += V.Count)
        {
            V z = Normal(numbers, t);
            V.Store(error > 0 ? Elementary.Exp(V.FusedMultiplyAdd(logSd, z, logMean)) : V.Create(mean), target + t);
        }
    }

    /// <summary>Replaces cumulative amounts C by those of the next period: mean f C, variance sigma^2 C^(2 - alpha).</summary>
    public void Advance(in ItemStream numbers, double* factor, double sigma, double* cumulative)
    {
        if (sigma == 0)
        {
            Multiply(cumulative, factor);
        }
        else if (_process == ProcessError.Gamma)
        {
            AdvanceGamma(numbers, factor, sigma, cumulative);
        }
        else
        {
            AdvanceLognormal(numbers, factor, sigma, cumulative);
        }
    }

    public void Dispose()
    {
        _columns.Dispose();
        _gamma.Dispose();
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Multiply(double* cumulative, double* factor)
    {
        for (int t = 0; t < _trials; t += V.Count)
        {
            V.Store(V.Load(cumulative + t) * V.Load(factor + t), cumulative + t);
        }
    }

    /// <summary>Shape f^2 C^alpha / sigma^2, scale sigma^2 C^(1 - alpha) / f.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void AdvanceGamma(in ItemStream numbers, double* factor, double sigma, double* cumulative)
    {
        double* shape = _columns[0];
        double* unit = _columns[1];
        V variance = V.Create(sigma * sigma);
        for (int t = 0; t < _trials; t += V.Count)
        {
            V f = V.Load(factor + t);
            V weight = _isVolumeWeighted ? V.Load(cumulative + t) : V.Create(1);
            V.Store(f * f * weight / variance, shape + t);
        }

        _gamma.Fill(numbers, 1, shape, unit);
        for (int t = 0; t < _trials; t += V.Count)
        {
            V scale = variance / V.Load(factor + t);
            scale = _isVolumeWeighted ? scale : scale * V.Load(cumulative + t);
            V.Store(V.Load(unit + t) * scale, cumulative + t);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void AdvanceLognormal(in ItemStream numbers, double* factor, double sigma, double* cumulative)
    {
        V variance = V.Create(sigma * sigma);
        V half = V.Create(0.5);
        for (int t = 0; t < _trials; t += V.Count)
        {
            V mean = V.Load(cumulative + t) * V.Load(factor + t);
            V f = V.Load(factor + t);
            V squaredCv = _isVolumeWeighted ? variance * V.Load(cumulative + t) / (mean * mean) : variance / (f * f);
            V logVariance = Elementary.Log1p(squaredCv);
            V exponent = V.FusedMultiplyAdd(V.Sqrt(logVariance), Normal(numbers, t), -(half * logVariance));
            V.Store(mean * Elementary.Exp(exponent), cumulative + t);
        }
    }

    private static V Normal(in ItemStream numbers, int offset)
    {
        V index = V.AddIntegers(V.CreateBits((ulong)(numbers.FirstTrial + offset)), V.Iota);
        numbers.Generate(index, 0, out V c0, out V c1, out _, out _);
        return NormalFunctions.QuantileOfOpenUniform(Uniform.Open(c0, c1));
    }
}
