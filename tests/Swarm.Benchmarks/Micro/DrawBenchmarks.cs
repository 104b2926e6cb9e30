using BenchmarkDotNet.Attributes;
using Swarm.Engine.Distributions;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Benchmarks.Micro;

/// <summary>Draws, generator included, over a tile of trials; the baseline is the platform's generator of uniforms.</summary>
public class DrawBenchmarks
{
    private const int Count = 512;
    private const double Tolerance = 5;
    private readonly double[] _values = new double[Count];
    private readonly Random _platform = new(1);
    private readonly StreamKey _key = StreamKey.Of(1, "draw", "benchmark");
    private readonly ContinuousUniform _uniform = new(0, 1);
    private readonly Normal _normal = new(1, 0.2);
    private readonly Lognormal _lognormal = new(0, 0.2);
    private readonly Gamma _gamma = new(20, 0.05);
    private long _firstTrial;

    [Params(512, 256, 128, 64)]
    public int Width { get; set; }

    [GlobalSetup]
    public void Check()
    {
        foreach (Distribution distribution in new Distribution[] { _uniform, _normal, _lognormal, _gamma })
        {
            Fill(distribution);
            double deviation = (_values.Average() - distribution.Mean) / (distribution.Sd / Math.Sqrt(Count));
            if (Math.Abs(deviation) > Tolerance)
                throw new InvalidOperationException($"{distribution.GetType().Name}: the mean is off by {deviation:F1} standard errors");
        }
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Count)]
    public void PlatformUniform()
    {
        for (var i = 0; i < Count; i++)
            _values[i] = _platform.NextDouble();
    }

    [Benchmark(OperationsPerInvoke = Count)]
    public void Uniform() => Fill(_uniform);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Normal() => Fill(_normal);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Lognormal() => Fill(_lognormal);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Gamma() => Fill(_gamma);

    private void Fill(Distribution distribution)
    {
        distribution.Fill(new DrawSlice(_key, _firstTrial, 1, (LaneWidth)Width), _values);
        _firstTrial += Count;
    }
}
