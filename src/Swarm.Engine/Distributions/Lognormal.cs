using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>Lognormal distribution. Values come by inverse transform, so they stay coupled when the parameters change.</summary>
/// <param name="logMean">Mean of the logarithm.</param>
/// <param name="logSd">Standard deviation of the logarithm, zero or more.</param>
public sealed class Lognormal(double logMean, double logSd) : Distribution
{
    /// <inheritdoc/>
    public override double Mean => Elementary.Exp(logMean + (0.5 * logSd * logSd));

    /// <inheritdoc/>
    public override double Sd => Mean * Math.Sqrt(Elementary.Expm1(logSd * logSd));

    /// <inheritdoc/>
    public override double Skewness
    {
        get
        {
            double squaredCv = Elementary.Expm1(logSd * logSd);
            return (squaredCv + 3) * Math.Sqrt(squaredCv);
        }
    }

    /// <summary>The lognormal with an arithmetic mean above 0 and a standard deviation.</summary>
    public static Lognormal OfMeanAndSd(double mean, double sd)
    {
        double cv = sd / mean;
        double logVariance = Elementary.Log1p(cv * cv);
        return new Lognormal(Elementary.Log(mean) - (0.5 * logVariance), Math.Sqrt(logVariance));
    }

    internal override bool CanOverflow => !double.IsFinite(Elementary.Exp(logMean + (LargestNormal * logSd)));

    internal override void Fill(in DrawSlice slice, Span<double> destination) =>
        UniformKernel.Fill(slice, new Transform(logMean, logSd), destination);

    private readonly struct Transform(double logMean, double logSd) : IUniformTransform
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public V Of<V>(V uniform)
            where V : unmanaged, ILanes<V> =>
            Elementary.Exp(V.FusedMultiplyAdd(V.Create(logSd), NormalFunctions.QuantileOfOpenUniform(uniform), V.Create(logMean)));
    }
}
