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
        const int Run = 256;
        ulong* keys = stackalloc ulong[Philox4x32.KeyWords];
        double* shapes = stackalloc double[(1 + GammaKernel<V>.ScratchColumns) * Run];
        int* pending = stackalloc int[Run];
        Philox4x32.ExpandKey(slice.Key, keys);
        new Span<double>(shapes, Run).Fill(shape);
        fixed (double* target = destination)
        {
            for (int start = 0; start < destination.Length; start += Run)
            {
                int trials = Math.Min(Run, destination.Length - start);
                var numbers = new ItemStream((nint)keys, slice.FirstTrial + start, slice.Step, 0);
                GammaKernel<V>.Fill(numbers, shapes, target + start, trials, shapes + Run, pending);
                Scale<V>(target + start, trials);
            }
        }
    }

    private unsafe void Scale<V>(double* values, int trials)
        where V : unmanaged, ILanes<V>
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            V.Store(V.Load(values + i) * V.Create(scale), values + i);
        }
    }
}
