using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Distributions;

/// <summary>
/// Gamma values of scale 1 by Marsaglia &amp; Tsang (2000): with d = a - 1/3, y = z / sqrt(9 d), v = (1 + y)^3, a normal z gives
/// d v if log U &lt; h = z^2/2 + d - d v + d log v. Below shape 1, a value of shape a + 1 is multiplied by U^(1/a).
/// <para>
/// Most values are settled without a logarithm. The series of h is -(z y)^2/12 (1 - 4/5 y + 4/6 y^2 - 4/7 y^3 ...), so that
/// h >= -(z y)^2 / (12 min(1, 1 + y)), and since exp(h) >= 1 + h, U is accepted where (1 - U) min(1, 1 + y) > (z y)^2 / 12.
/// That leaves about one value in 36 d to the second pass, which takes the left-over trials side by side. Which trials share a
/// vector changes no bit: attempt k of a trial's item has a counter of its own.
/// </para>
/// </summary>
internal static unsafe class GammaKernel<V>
    where V : unmanaged, ILanes<V>
{
    // A rejection has a chance of 5 % at the worst shape: 60 in a row do not happen.
    private const int MaxAttempts = 1000;

    /// <summary>Draws one value a trial.</summary>
    /// <param name="numbers">Which random numbers.</param>
    /// <param name="shape">Shapes, zero or more, one a trial.</param>
    /// <param name="target">Receives the values.</param>
    /// <param name="trials">Number of trials, a multiple of the vector width.</param>
    /// <param name="pending">Room for one number a trial.</param>
    public static void Fill(in ItemStream numbers, double* shape, double* target, int trials, int* pending)
    {
        int left = FirstPass(numbers, shape, target, trials, pending);
        for (int attempt = 0; left > 0 && attempt < MaxAttempts; attempt++)
        {
            left = NextPass(numbers, attempt, shape, target, pending, left);
        }
    }

    private static int FirstPass(ItemStream numbers, double* shape, double* target, int trials, int* pending)
    {
        int left = 0;
        for (int i = 0; i < trials; i += V.Count)
        {
            V index = V.AddIntegers(V.CreateBits((ulong)(numbers.FirstTrial + i)), V.Iota);
            V a = V.Load(shape + i);
            V boosted = V.LessThan(a, V.Create(1));
            V d = Offset(a, boosted);
            V z = Attempt(numbers, index, 0, out V uniform);
            V value = Candidate(d, z, out V y);
            V square = z * y * (z * y);
            V bound = (V.Create(1) - uniform) * LaneMath.Min(V.Create(1), V.Create(1) + y);
            V accepted = V.LessThan(square, V.Create(12) * bound);
            if (V.Any(boosted))
            {
                value = value * V.Select(boosted, Boost(numbers, index, a), V.Create(1));
            }

            V.Store(value, target + i);
            ulong rejected = V.SignBits(~accepted);
            for (; rejected != 0; rejected &= rejected - 1)
            {
                pending[left++] = i + System.Numerics.BitOperations.TrailingZeroCount(rejected);
            }
        }

        return left;
    }

    /// <summary>Tests one attempt of the pending trials to the end; keeps those that are rejected.</summary>
    private static int NextPass(ItemStream numbers, int attempt, double* shape, double* target, int* pending, int count)
    {
        double* lanes = stackalloc double[3 * V.Count];
        double* shapes = lanes + V.Count;
        double* values = shapes + V.Count;
        int left = 0;
        for (int start = 0; start < count; start += V.Count)
        {
            int used = Math.Min(V.Count, count - start);
            for (int lane = 0; lane < V.Count; lane++)
            {
                int trial = pending[start + Math.Min(lane, used - 1)];
                lanes[lane] = BitConverter.Int64BitsToDouble(numbers.FirstTrial + trial);
                shapes[lane] = shape[trial];
            }

            V index = V.Load(lanes);
            V a = V.Load(shapes);
            V boosted = V.LessThan(a, V.Create(1));
            V accepted = Exact(numbers, index, attempt, a, boosted, out V value);
            V.Store(value * V.Select(boosted, Boost(numbers, index, a), V.Create(1)), values);
            ulong taken = V.SignBits(accepted);
            for (int lane = 0; lane < used; lane++)
            {
                int trial = pending[start + lane];
                if ((taken >> lane & 1) != 0)
                {
                    target[trial] = values[lane];
                }
                else
                {
                    pending[left++] = trial;
                }
            }
        }

        return left;
    }

    private static V Exact(in ItemStream numbers, V index, int attempt, V a, V boosted, out V value)
    {
        V d = Offset(a, boosted);
        V z = Attempt(numbers, index, attempt, out V uniform);
        value = Candidate(d, z, out V y);
        V cube = Cube(y);
        V h = V.FusedMultiplyAdd(V.Create(0.5) * z, z, d * (V.Create(1) - cube + Elementary.Log(cube)));
        return V.LessThan(V.Create(-1), y) & V.LessThan(Elementary.Log(uniform), h);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Offset(V a, V boosted) => a + V.Select(boosted, V.Create(2.0 / 3), V.Create(-1.0 / 3));

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Candidate(V d, V z, out V y)
    {
        y = z / V.Sqrt(V.Create(9) * d);
        return d * Cube(y);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Cube(V y)
    {
        V t = V.Create(1) + y;
        return t * t * t;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Attempt(in ItemStream numbers, V index, int attempt, out V uniform)
    {
        numbers.Generate(index, attempt, out V c0, out V c1, out V c2, out V c3);
        uniform = Uniform.Open(c2, c3);
        return NormalFunctions.Quantile(Uniform.Open(c0, c1));
    }

    /// <summary>U^(1/a), with a uniform that belongs to no attempt.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static V Boost(in ItemStream numbers, V index, V a)
    {
        numbers.Generate(index, Counter.SideAttempt, out V c0, out V c1, out _, out _);
        return Elementary.Exp(Elementary.Log(Uniform.Open(c0, c1)) / a);
    }
}
