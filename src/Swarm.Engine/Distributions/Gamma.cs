using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>
/// Gamma distribution, drawn by rejection (<see cref="GammaKernel{V}"/>): most, not all, values stay coupled when the
/// parameters change.
/// </summary>
/// <param name="shape">Shape, above 0.</param>
/// <param name="scale">Scale, above 0.</param>
public sealed class Gamma(double shape, double scale) : Distribution
{
    private const int Run = 256;

    /// <inheritdoc/>
    public override double Mean => shape * scale;

    /// <inheritdoc/>
    public override double Sd => Math.Sqrt(shape) * scale;

    /// <inheritdoc/>
    public override double Skewness => 2 / Math.Sqrt(shape);

    internal override void Fill(in DrawSlice slice, Span<double> destination)
    {
        switch (slice.Width)
        {
            case LaneWidth.Vector512: Fill<Lanes512>(slice, destination); break;
            case LaneWidth.Vector256: Fill<Lanes256>(slice, destination); break;
            case LaneWidth.Vector128: Fill<Lanes128>(slice, destination); break;
            default: Fill<Lanes64>(slice, destination); break;
        }
    }

    private unsafe void Fill<V>(in DrawSlice slice, Span<double> destination)
        where V : unmanaged, ILanes<V>
    {
        GammaKernel<V> kernel = Scratch<V>.Kernel;
        ulong* keys = stackalloc ulong[Philox4x32.KeyWords];
        double* shapes = stackalloc double[2 * Run];
        double* units = shapes + Run;
        Philox4x32.ExpandKey(slice.Key, keys);
        new Span<double>(shapes, Run).Fill(shape);
        for (int start = 0; start < destination.Length; start += Run)
        {
            var numbers = new ItemStream((nint)keys, slice.FirstTrial + start, slice.Step, 0);
            kernel.Fill(numbers, 1, shapes, units);
            for (int i = 0; i < Run; i += V.Count)
            {
                V.Store(V.Load(units + i) * V.Create(scale), units + i);
            }

            int trials = Math.Min(Run, destination.Length - start);
            new ReadOnlySpan<double>(units, trials).CopyTo(destination.Slice(start, trials));
        }
    }

    /// <summary>Working memory of a thread; it holds no value from one call to the next.</summary>
    private static class Scratch<V>
        where V : unmanaged, ILanes<V>
    {
        [ThreadStatic]
        private static GammaKernel<V>? _kernel;

        public static GammaKernel<V> Kernel => _kernel ??= new GammaKernel<V>(1, Run);
    }
}
