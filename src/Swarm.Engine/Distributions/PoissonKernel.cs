using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>
/// Poisson counts, one mean a trial: below a mean of 10 by inversion of one uniform, from there on by transformed rejection
/// with squeeze (Hörmann 1993, algorithm PTRS).
/// </summary>
internal static unsafe class PoissonKernel<V>
    where V : unmanaged, ILanes<V>
{
    private const double InversionBelow = 10;

    // Inversion of the largest uniform below 1 with the largest mean ends before this count.
    private const int MaxInvertedCount = 100;

    // A rejection has a chance of 15 % at the worst mean.
    private const int MaxAttempts = 1000;

    /// <summary>Draws one count a trial.</summary>
    /// <param name="numbers">Which random numbers.</param>
    /// <param name="means">Means, zero or more, one a trial.</param>
    /// <param name="target">Receives the counts.</param>
    /// <param name="trials">Number of trials, a multiple of the vector width.</param>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    public static void Fill(in ItemStream numbers, double* means, double* target, int trials)
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            V index = V.AddIntegers(V.CreateBits((ulong)(numbers.FirstTrial + i)), V.Iota);
            V mean = V.Load(means + i);
            V isSmall = V.LessThan(mean, V.Create(InversionBelow));
            V count = V.Any(isSmall) ? Invert(numbers, index, V.Select(isSmall, mean, V.Create(0))) : V.Create(0);
            V isLarge = ~isSmall;
            if (V.Any(isLarge))
            {
                V large = Reject(numbers, index, V.Select(isSmall, V.Create(InversionBelow), mean), isLarge);
                count = V.Select(isSmall, count, large);
            }

            V.Store(count, target + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V Invert(in ItemStream numbers, V index, V mean)
    {
        numbers.Generate(index, 0, out V c0, out V c1, out _, out _);
        V uniform = Uniform.Open(c0, c1);
        V chance = Elementary.Exp(-mean);
        V passed = chance;
        V count = V.Create(0);
        for (int k = 1; k <= MaxInvertedCount; k++)
        {
            V beyond = V.LessThan(passed, uniform);
            if (!V.Any(beyond))
            {
                break;
            }

            count += beyond & V.Create(1);
            chance = chance * mean / V.Create(k);
            passed += chance;
        }

        return count;
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V Reject(in ItemStream numbers, V index, V mean, V open)
    {
        V b = V.FusedMultiplyAdd(V.Create(2.53), V.Sqrt(mean), V.Create(0.931));
        V a = V.FusedMultiplyAdd(V.Create(0.02483), b, V.Create(-0.059));
        V inverseAlpha = V.Create(1.1239) + (V.Create(1.1328) / (b - V.Create(3.4)));
        V squeeze = V.Create(0.9277) - (V.Create(3.6224) / (b - V.Create(2)));
        V result = V.CreateBits(BitConverter.DoubleToUInt64Bits(double.NaN));
        for (int attempt = 0; attempt < MaxAttempts && V.Any(open); attempt++)
        {
            numbers.Generate(index, attempt, out V c0, out V c1, out V c2, out V c3);
            V u = Uniform.Open(c0, c1) - V.Create(0.5);
            V v = Uniform.Open(c2, c3);
            V side = V.Create(0.5) - V.Abs(u);
            V count = V.Floor(V.FusedMultiplyAdd((V.Create(2) * a / side) + b, u, mean + V.Create(0.43)));
            V quick = V.LessThanOrEqual(V.Create(0.07), side) & V.LessThanOrEqual(v, squeeze);
            V accepted = open & (quick | (Possible(count, side, v) & Exact(count, mean, v, inverseAlpha, a, b, side)));
            result = V.Select(accepted, count, result);
            open &= ~accepted;
        }

        return result;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Possible(V count, V side, V v) =>
        V.LessThanOrEqual(V.Create(0), count) & ~(V.LessThan(side, V.Create(0.013)) & V.LessThan(side, v));

    private static V Exact(V count, V mean, V v, V inverseAlpha, V a, V b, V side)
    {
        V left = Elementary.Log(v * inverseAlpha / ((a / (side * side)) + b));
        V right = V.FusedMultiplyAdd(count, Elementary.Log(mean), -mean) - LogFactorial(count);
        return V.LessThanOrEqual(left, right);
    }

    /// <summary>log(n!) by Stirling's series at n + 9, taken back by the product (n + 1) ... (n + 8).</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V LogFactorial(V n)
    {
        V product = V.Create(1);
        V x = n;
        for (int i = 0; i < 8; i++)
        {
            x += V.Create(1);
            product *= x;
        }

        x += V.Create(1);
        V inverse = V.Create(1) / x;
        V square = inverse * inverse;
        V series = V.FusedMultiplyAdd(square, V.Create(1.0 / 1260), V.Create(-1.0 / 360));
        series = inverse * V.FusedMultiplyAdd(square, series, V.Create(1.0 / 12));
        V logOfX = Elementary.Log(x);
        V stirling = V.FusedMultiplyAdd(x - V.Create(0.5), logOfX, -x) + V.Create(0.91893853320467274178) + series;
        return stirling - Elementary.Log(product);
    }
}
