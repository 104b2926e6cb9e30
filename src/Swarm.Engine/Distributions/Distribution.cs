using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>A distribution with its parameters bound.</summary>
public abstract class Distribution
{
    /// <summary>Mean, or NaN where it does not exist.</summary>
    public abstract double Mean { get; }

    /// <summary>Standard deviation, or NaN where it does not exist.</summary>
    public abstract double Sd { get; }

    /// <summary>Skewness, or NaN where it does not exist.</summary>
    public abstract double Skewness { get; }

    /// <summary>
    /// True unless every value that can be drawn is a finite number for certain; then a run need not look. Open uniforms keep a
    /// normal value within <see cref="LargestNormal"/> standard deviations.
    /// </summary>
    internal virtual bool CanOverflow => true;

    /// <summary>Above the normal quantile of 1 - 2^-53.</summary>
    private protected const double LargestNormal = 8.5;

    /// <summary>Draws one value for each of a run of consecutive trials.</summary>
    /// <param name="slice">Stream, first trial (a multiple of 16) and step.</param>
    /// <param name="destination">One value a trial; its length is a multiple of 16.</param>
    internal abstract void Fill(in DrawSlice slice, Span<double> destination);
}
