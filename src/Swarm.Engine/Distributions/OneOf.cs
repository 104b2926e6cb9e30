using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>One of several values, each with a chance. Values come by inverse transform in the order of the list.</summary>
public sealed class OneOf : Distribution
{
    private readonly double[] _values;
    private readonly double[] _cumulative;

    /// <summary>Binds values to chances.</summary>
    /// <param name="values">The values, at least one.</param>
    /// <param name="chances">Their chances, as many as values, none negative, summing to 1 up to rounding.</param>
    public OneOf(IReadOnlyList<double> values, IReadOnlyList<double> chances)
    {
        ArgumentOutOfRangeException.ThrowIfNotEqual(chances.Count, values.Count);
        _values = [.. values];
        _cumulative = new double[values.Count];
        double sum = 0;
        for (int i = 0; i < chances.Count; i++)
        {
            sum += chances[i];
            _cumulative[i] = sum;
        }

        // The last value takes what rounding left over.
        _cumulative[^1] = 1;
        Mean = Moment(chances, x => x);
        double variance = Moment(chances, x => (x - Mean) * (x - Mean));
        Sd = Math.Sqrt(variance);
        Skewness = Moment(chances, x => (x - Mean) * (x - Mean) * (x - Mean)) / (variance * Sd);
    }

    /// <inheritdoc/>
    public override double Mean { get; }

    /// <inheritdoc/>
    public override double Sd { get; }

    /// <inheritdoc/>
    public override double Skewness { get; }

    internal override bool CanOverflow => false;

    internal override unsafe void Fill(in DrawSlice slice, Span<double> destination)
    {
        fixed (double* values = _values, cumulative = _cumulative)
        {
            UniformKernel.Fill(slice, new Transform((nint)values, (nint)cumulative, _values.Length), destination);
        }
    }

    private double Moment(IReadOnlyList<double> chances, Func<double, double> of)
    {
        double sum = 0;
        for (int i = 0; i < _values.Length; i++)
        {
            sum += chances[i] * of(_values[i]);
        }

        return sum;
    }

    /// <summary>Each value takes the place of the one before where the uniform has passed that one's cumulative chance.</summary>
    private readonly unsafe struct Transform(nint values, nint cumulative, int count) : IUniformTransform
    {
        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public V Of<V>(V uniform)
            where V : unmanaged, ILanes<V>
        {
            V value = V.Create(((double*)values)[0]);
            for (int i = 1; i < count; i++)
            {
                V passed = V.LessThanOrEqual(V.Create(((double*)cumulative)[i - 1]), uniform);
                value = V.Select(passed, V.Create(((double*)values)[i]), value);
            }

            return value;
        }
    }
}
