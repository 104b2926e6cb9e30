using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>Uniform distribution between two ends. Values come by inverse transform.</summary>
/// <param name="low">Lower end.</param>
/// <param name="high">Upper end, above the lower.</param>
public sealed class ContinuousUniform(double low, double high) : Distribution
{
    /// <inheritdoc/>
    public override double Mean => (0.5 * low) + (0.5 * high);

    /// <inheritdoc/>
    public override double Sd => (high - low) / Math.Sqrt(12);

    /// <inheritdoc/>
    public override double Skewness => 0;

    internal override bool CanOverflow => !double.IsFinite(Math.Abs(low) + Math.Abs(high));

    internal override void Fill(in DrawSlice slice, Span<double> destination) =>
        UniformKernel.Fill(slice, new Transform(low, high), destination);

    private readonly struct Transform(double low, double high) : IUniformTransform
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public V Of<V>(V uniform)
            where V : unmanaged, ILanes<V> =>
            V.FusedMultiplyAdd(V.Create(high), uniform, V.Create(low) * (V.Create(1) - uniform));
    }
}
