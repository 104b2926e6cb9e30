using BenchmarkDotNet.Attributes;
using Swarm.Engine.Numerics;

namespace Swarm.Benchmarks.Micro;

/// <summary>The elementary functions over columns in the first-level cache; the baseline is the platform's exp.</summary>
public unsafe class ElementaryBenchmarks
{
    private const int Count = 1024;
    private readonly double[] _any = new double[Count];
    private readonly double[] _positive = new double[Count];
    private readonly double[] _uniform = new double[Count];
    private readonly double[] _result = new double[Count];

    [Params(512, 256, 128, 64)]
    public int Width { get; set; }

    [GlobalSetup]
    public void Fill()
    {
        var random = new Random(1);
        for (var i = 0; i < Count; i++)
        {
            _any[i] = (random.NextDouble() * 20) - 10;
            _positive[i] = Math.Exp(_any[i]);
            _uniform[i] = ((2 * random.NextInt64(1L << 52)) + 1) * 1.1102230246251565e-16;
        }

        Exp();
        for (var i = 0; i < Count; i++)
        {
            if (Math.Abs(_result[i] - _positive[i]) > _positive[i] * 1e-15)
                throw new InvalidOperationException($"exp({_any[i]:R}) came out as {_result[i]:R}");
        }
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Count)]
    public void PlatformExp()
    {
        for (var i = 0; i < Count; i++)
            _result[i] = Math.Exp(_any[i]);
    }

    [Benchmark(OperationsPerInvoke = Count)]
    public void Exp() => Run<ExpOf>(_any, _any);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Log() => Run<LogOf>(_positive, _positive);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Expm1() => Run<Expm1Of>(_any, _any);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Log1p() => Run<Log1pOf>(_positive, _positive);

    [Benchmark(OperationsPerInvoke = Count)]
    public void Pow() => Run<PowOf>(_positive, _any);

    [Benchmark(OperationsPerInvoke = Count)]
    public void NormalCdf() => Run<CdfOf>(_any, _any);

    [Benchmark(OperationsPerInvoke = Count)]
    public void NormalQuantile() => Run<QuantileOf>(_uniform, _uniform);

    private void Run<F>(double[] x, double[] y)
        where F : IFunction
    {
        fixed (double* px = x, py = y, pr = _result)
        {
            switch (Width)
            {
                case 512: Over<F, Lanes512>(px, py, pr); break;
                case 256: Over<F, Lanes256>(px, py, pr); break;
                case 128: Over<F, Lanes128>(px, py, pr); break;
                default: Over<F, Lanes64>(px, py, pr); break;
            }
        }
    }

    private static void Over<F, V>(double* x, double* y, double* result)
        where F : IFunction
        where V : unmanaged, ILanes<V>
    {
        for (var i = 0; i < Count; i += V.Count)
            V.Store(F.Apply(V.Load(x + i), V.Load(y + i)), result + i);
    }

    private interface IFunction
    {
        static abstract V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V>;
    }

    private readonly struct ExpOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Exp(x);
    }

    private readonly struct LogOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Log(x);
    }

    private readonly struct Expm1Of : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Expm1(x);
    }

    private readonly struct Log1pOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Log1p(x);
    }

    private readonly struct PowOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Pow(x, y);
    }

    private readonly struct CdfOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => NormalFunctions.Cdf(x);
    }

    private readonly struct QuantileOf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => NormalFunctions.QuantileOfOpenUniform(x);
    }
}
