using Swarm.Engine.Numerics;

namespace Swarm.Engine.Tests.Numerics;

/// <summary>A function over lanes that a test can run at any width.</summary>
internal abstract class LaneFunction(string name)
{
    public static readonly LaneFunction[] All =
    [
        new Of<Exp>("exp"), new Of<Log>("log"), new Of<Expm1>("expm1"), new Of<Log1p>("log1p"), new Of<Pow>("pow"),
        new Of<Cdf>("normal-cdf"), new Of<Quantile>("normal-quantile"), new Of<Min>("min"), new Of<Max>("max"),
    ];

    private interface IFunction
    {
        static abstract V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V>;
    }

    public static LaneFunction Named(string name) => All.Single(f => f.ToString() == name);

    public override string ToString() => name;

    public abstract double[] Run(LaneWidth width, double[] x, double[] y);

    private static unsafe double[] Run<F, V>(double[] x, double[] y)
        where F : IFunction
        where V : unmanaged, ILanes<V>
    {
        var padded = (x.Length + 7) / 8 * 8;
        Array.Resize(ref x, padded);
        Array.Resize(ref y, padded);
        var result = new double[padded];
        fixed (double* px = x, py = y, pr = result)
        {
            for (var i = 0; i < padded; i += V.Count)
                V.Store(F.Apply(V.Load(px + i), V.Load(py + i)), pr + i);
        }

        return result;
    }

    private sealed class Of<F>(string name) : LaneFunction(name)
        where F : IFunction
    {
        public override double[] Run(LaneWidth width, double[] x, double[] y) => width switch
        {
            LaneWidth.Vector512 => Run<F, Lanes512>(x, y),
            LaneWidth.Vector256 => Run<F, Lanes256>(x, y),
            LaneWidth.Vector128 => Run<F, Lanes128>(x, y),
            _ => Run<F, Lanes64>(x, y),
        };
    }

    private readonly struct Exp : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Exp(x);
    }

    private readonly struct Log : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Log(x);
    }

    private readonly struct Expm1 : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Expm1(x);
    }

    private readonly struct Log1p : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Log1p(x);
    }

    private readonly struct Pow : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => Elementary.Pow(x, y);
    }

    private readonly struct Cdf : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => NormalFunctions.Cdf(x);
    }

    private readonly struct Quantile : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => NormalFunctions.Quantile(x);
    }

    private readonly struct Min : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => LaneMath.Min(x, y);
    }

    private readonly struct Max : IFunction
    {
        public static V Apply<V>(V x, V y)
            where V : unmanaged, ILanes<V> => LaneMath.Max(x, y);
    }
}
