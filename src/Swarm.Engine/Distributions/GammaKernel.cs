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
    /// <summary>Columns of scratch memory that a call needs.</summary>
    public const int ScratchColumns = 4;

    // A rejection has a chance of 5 % at the worst shape: 60 in a row do not happen.
    private const int MaxAttempts = 1000;

    /// <summary>Draws one value a trial.</summary>
    /// <param name="numbers">Which random numbers.</param>
    /// <param name="shape">Shapes, zero or more, one a trial.</param>
    /// <param name="target">Receives the values.</param>
    /// <param name="trials">Number of trials, a multiple of the vector width.</param>
    /// <param name="scratch">Room for <see cref="ScratchColumns"/> numbers a trial.</param>
    /// <param name="pending">Room for one number a trial.</param>
    public static void Fill(in ItemStream numbers, double* shape, double* target, int trials, double* scratch, int* pending)
    {
        var columns = new Columns(scratch, trials);
        FillUniforms(numbers, columns.Normals, columns.Uniforms, trials);
        MakeNormal(columns.Normals, trials);
        int left = AcceptMost(shape, columns.Normals, columns.Uniforms, target, trials, pending, out bool isBoosted);
        for (int attempt = 0; left > 0 && attempt < MaxAttempts; attempt++)
        {
            left = AcceptExactly(numbers, attempt, shape, target, columns, pending, left);
        }

        if (isBoosted)
        {
            Boost(numbers, shape, target, trials);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void FillUniforms(in ItemStream numbers, double* first, double* second, int trials)
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            numbers.Generate(Index(numbers, i), 0, out V c0, out V c1, out V c2, out V c3);
            V.Store(Uniform.Open(c0, c1), first + i);
            V.Store(Uniform.Open(c2, c3), second + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void MakeNormal(double* uniforms, int trials)
    {
        for (int i = 0; i < trials; i += V.Count)
        {
            V.Store(NormalFunctions.QuantileOfOpenUniform(V.Load(uniforms + i)), uniforms + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static int AcceptMost(
        double* shape, double* normals, double* uniforms, double* target, int trials, int* pending, out bool isBoosted)
    {
        int left = 0;
        V anyBoosted = V.Create(0);
        V one = V.Create(1);
        for (int i = 0; i < trials; i += V.Count)
        {
            V a = V.Load(shape + i);
            V boosted = V.LessThan(a, one);
            anyBoosted |= boosted;
            V z = V.Load(normals + i);
            V.Store(Candidate(Offset(a, boosted), z, out V y), target + i);
            V product = z * y;

            // An infinite or undefined y fails the test, as it should, so the bare comparison will do for the minimum.
            V beyond = one + y;
            V bound = (one - V.Load(uniforms + i)) * V.Select(V.LessThan(beyond, one), beyond, one);
            ulong rejected = V.SignBits(~V.LessThan(product * product, V.Create(12) * bound));
            for (; rejected != 0; rejected &= rejected - 1)
            {
                pending[left++] = i + System.Numerics.BitOperations.TrailingZeroCount(rejected);
            }
        }

        isBoosted = V.Any(anyBoosted);
        return left;
    }

    /// <summary>Tests one attempt of the pending trials to the end, side by side; keeps those that are rejected.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static int AcceptExactly(
        in ItemStream numbers, int attempt, double* shape, double* target, in Columns columns, int* pending, int count)
    {
        int padded = Gather(numbers.FirstTrial, shape, columns, pending, count);
        FillUniforms(numbers, attempt, columns, padded);
        MakeNormal(columns.Normals, padded);
        TestAgainstLogarithms(columns, padded);
        int left = 0;
        for (int k = 0; k < count; k++)
        {
            int trial = pending[k];
            target[trial] = columns.Normals[k];
            pending[left] = trial;
            left += columns.Uniforms[k] != 0 ? 0 : 1;
        }

        return left;
    }

    /// <summary>Trial numbers and shapes of the pending trials side by side; the last is repeated to fill a vector.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static int Gather(long firstTrial, double* shape, in Columns columns, int* pending, int count)
    {
        int padded = (count + V.Count - 1) / V.Count * V.Count;
        for (int k = 0; k < padded; k++)
        {
            int trial = pending[Math.Min(k, count - 1)];
            columns.Trials[k] = BitConverter.Int64BitsToDouble(firstTrial + trial);
            columns.Shapes[k] = shape[trial];
        }

        return padded;
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void FillUniforms(in ItemStream numbers, int attempt, in Columns columns, int trials)
    {
        for (int k = 0; k < trials; k += V.Count)
        {
            numbers.Generate(V.Load(columns.Trials + k), attempt, out V c0, out V c1, out V c2, out V c3);
            V.Store(Uniform.Open(c0, c1), columns.Normals + k);
            V.Store(Uniform.Open(c2, c3), columns.Uniforms + k);
        }
    }

    /// <summary>Replaces normals by candidates and uniforms by 1 where the candidate is accepted, by 0 where it is not.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void TestAgainstLogarithms(in Columns columns, int trials)
    {
        V one = V.Create(1);
        for (int k = 0; k < trials; k += V.Count)
        {
            V a = V.Load(columns.Shapes + k);
            V d = Offset(a, V.LessThan(a, one));
            V z = V.Load(columns.Normals + k);
            V.Store(Candidate(d, z, out V y), columns.Normals + k);
            V cube = Cube(y);
            V bound = V.FusedMultiplyAdd(V.Create(0.5) * z, z, d * (one - cube + Elementary.Log(cube)));

            // A negative cube has no logarithm: the comparison with NaN is false, and the attempt is rejected as it should be.
            V accepted = V.LessThan(Elementary.Log(V.Load(columns.Uniforms + k)), bound);
            V.Store(accepted & one, columns.Uniforms + k);
        }
    }

    /// <summary>Multiplies the values of shapes below 1 by U^(1/a), with a uniform that belongs to no attempt.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    private static void Boost(in ItemStream numbers, double* shape, double* target, int trials)
    {
        V one = V.Create(1);
        for (int i = 0; i < trials; i += V.Count)
        {
            V a = V.Load(shape + i);
            V boosted = V.LessThan(a, one);
            if (V.Any(boosted))
            {
                numbers.Generate(Index(numbers, i), Counter.SideAttempt, out V c0, out V c1, out _, out _);
                V factor = Elementary.Exp(Elementary.Log(Uniform.Open(c0, c1)) / a);
                V.Store(V.Load(target + i) * V.Select(boosted, factor, one), target + i);
            }
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V Index(in ItemStream numbers, int offset) =>
        V.AddIntegers(V.CreateBits((ulong)(numbers.FirstTrial + offset)), V.Iota);

    /// <summary>d = a - 1/3, or that of shape a + 1.</summary>
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

    private readonly struct Columns(double* scratch, int trials)
    {
        public double* Normals { get; } = scratch;

        public double* Uniforms { get; } = scratch + trials;

        public double* Trials { get; } = scratch + (2 * trials);

        public double* Shapes { get; } = scratch + (3 * trials);
    }
}
