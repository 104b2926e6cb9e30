using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>One of several values, each with a chance. Values come by inverse transform in the order of the list.</summary>
public sealed class OneOf : Distribution
{
    // Chances written with nine decimals are taken as meant.
    private const double RoundingAllowance = 1e-9;

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

    /// <summary><c>one_of(values, chances)</c>.</summary>
    public static DistributionForm Form { get; } = new(
        "one_of",
        [
            new ParameterForm("values", ParameterKind.Numbers, "The values."),
            new ParameterForm("chances", ParameterKind.Numbers, "The chance of each value; they sum to 1."),
        ],
        "One of several values, each with its chance.",
        arguments => DistributionBinding.Of(
            Problems(arguments.Numbers("values"), arguments.Numbers("chances")),
            () => new OneOf(arguments.Numbers("values"), arguments.Numbers("chances"))));

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

    private static ParameterProblem[] Problems(IReadOnlyList<double> values, IReadOnlyList<double> chances)
    {
        if (values.Count != chances.Count)
        {
            return [new ParameterProblem("chances", $"{values.Count} values need {values.Count} chances, not {chances.Count}", null)];
        }

        double sum = 0;
        foreach (double chance in chances)
        {
            sum += chance;
        }

        ParameterProblem[] negative = chances.Any(chance => chance < 0)
            ? [new ParameterProblem("chances", "a chance must be 0 or more", null)]
            : [];
        return Math.Abs(sum - 1) <= RoundingAllowance
            ? negative
            : [.. negative, new ParameterProblem("chances", $"the chances sum to {sum:R}, not to 1", "write fractions as 1/3")];
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
