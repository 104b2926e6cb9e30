using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>Normal distribution. Values come by inverse transform, so they stay coupled when the parameters change.</summary>
/// <param name="mean">Mean.</param>
/// <param name="sd">Standard deviation, zero or more.</param>
public sealed class Normal(double mean, double sd) : Distribution
{
    /// <inheritdoc/>
    public override double Mean => mean;

    /// <inheritdoc/>
    public override double Sd => sd;

    /// <inheritdoc/>
    public override double Skewness => 0;

    internal override bool CanOverflow => !double.IsFinite(Math.Abs(mean) + (LargestNormal * sd));

    internal override void Fill(in DrawSlice slice, Span<double> destination) =>
        UniformKernel.Fill(slice, new Transform(mean, sd), destination);

    private readonly struct Transform(double mean, double sd) : IUniformTransform
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public V Of<V>(V uniform)
            where V : unmanaged, ILanes<V> =>
            V.FusedMultiplyAdd(V.Create(sd), NormalFunctions.QuantileOfOpenUniform(uniform), V.Create(mean));
    }
}
