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
/// That leaves about one value in 36 d to the second pass, which takes the left-over values of all rows side by side. Which values
/// share a vector changes no bit: attempt k of a trial's item has a counter of its own.
/// </para>
/// </summary>
internal sealed unsafe class GammaKernel<V> : IDisposable
    where V : unmanaged, ILanes<V>
{
    // A rejection has a chance of 5 % at the worst shape: 60 in a row do not happen.
    private const int MaxAttempts = 1000;

    private readonly int _trials;
    private readonly ColumnMemory _columns;
    private readonly int[] _pending;
    private readonly bool[] _isBoosted;

    /// <param name="rows">Largest number of rows of a call.</param>
    /// <param name="trials">Trials of a row, a multiple of the vector width.</param>
    public GammaKernel(int rows, int trials)
    {
        _trials = trials;
        _columns = new ColumnMemory(5, trials);
        _pending = new int[rows * trials];
        _isBoosted = new bool[rows];
    }

    private double* Normals => _columns[0];

    private double* Uniforms => _columns[1];

    private double* Trials => _columns[2];

    private double* Items => _columns[3];

    private double* Shapes => _columns[4];

    /// <summary>Draws one value a trial of each row. Row r draws as item <c>numbers.Item + r</c>.</summary>
    /// <param name="numbers">Which random numbers; the item is that of the first row.</param>
    /// <param name="rows">Number of rows.</param>
    /// <param name="shape">Shapes, zero or more: row after row.</param>
    /// <param name="target">Receives the values: row after row.</param>
    public void Fill(in ItemStream numbers, int rows, double* shape, double* target)
    {
        int left = 0;
        for (int row = 0; row < rows; row++)
        {
            FillUniforms(numbers with { Item = numbers.Item + row });
            MakeNormal(_trials);
            left = AcceptMost(shape, target, row, left);
        }

        for (int attempt = 0; left > 0 && attempt < MaxAttempts; attempt++)
        {
            left = AcceptPending(numbers, attempt, shape, target, left);
        }

        for (int row = 0; row < rows; row++)
        {
            if (_isBoosted[row])
            {
                Boost(numbers with { Item = numbers.Item + row }, shape + ((nint)row * _trials), target + ((nint)row * _trials));
            }
        }
    }

    public void Dispose() => _columns.Dispose();

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void FillUniforms(in ItemStream numbers)
    {
        for (int i = 0; i < _trials; i += V.Count)
        {
            numbers.Generate(Index(numbers, i), 0, out V c0, out V c1, out V c2, out V c3);
            V.Store(Uniform.Open(c0, c1), Normals + i);
            V.Store(Uniform.Open(c2, c3), Uniforms + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void MakeNormal(int trials)
    {
        double* normals = Normals;
        for (int i = 0; i < trials; i += V.Count)
        {
            V.Store(NormalFunctions.QuantileOfOpenUniform(V.Load(normals + i)), normals + i);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private int AcceptMost(double* shapes, double* targets, int row, int left)
    {
        double* shape = shapes + ((nint)row * _trials);
        double* target = targets + ((nint)row * _trials);
        double* normals = Normals;
        double* uniforms = Uniforms;
        V anyBoosted = V.Create(0);
        V one = V.Create(1);
        for (int i = 0; i < _trials; i += V.Count)
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
                _pending[left++] = (row * _trials) + i + System.Numerics.BitOperations.TrailingZeroCount(rejected);
            }
        }

        _isBoosted[row] = V.Any(anyBoosted);
        return left;
    }

    /// <summary>Tests one attempt of all pending values to the end, as many side by side as a column holds.</summary>
    private int AcceptPending(in ItemStream numbers, int attempt, double* shape, double* target, int count)
    {
        int left = 0;
        for (int start = 0; start < count; start += _trials)
        {
            left = AcceptExactly(numbers, attempt, shape, target, start, Math.Min(_trials, count - start), left);
        }

        return left;
    }

    private int AcceptExactly(in ItemStream numbers, int attempt, double* shape, double* target, int start, int count, int left)
    {
        int padded = (count + V.Count - 1) / V.Count * V.Count;
        Gather(numbers, shape, start, count, padded);
        FillUniforms(numbers, attempt, padded);
        MakeNormal(padded);
        TestAgainstLogarithms(padded);
        double* values = Normals;
        double* accepted = Uniforms;
        for (int k = 0; k < count; k++)
        {
            int value = _pending[start + k];
            target[value] = values[k];
            _pending[left] = value;
            left += accepted[k] != 0 ? 0 : 1;
        }

        return left;
    }

    /// <summary>Trials, items and shapes of pending values side by side; the last is repeated to fill a vector.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Gather(in ItemStream numbers, double* shape, int start, int count, int padded)
    {
        for (int k = 0; k < padded; k++)
        {
            int value = _pending[start + Math.Min(k, count - 1)];
            (int row, int trial) = Math.DivRem(value, _trials);
            Trials[k] = BitConverter.Int64BitsToDouble(numbers.FirstTrial + trial);
            Items[k] = BitConverter.Int64BitsToDouble(numbers.Item + row);
            Shapes[k] = shape[value];
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void FillUniforms(in ItemStream numbers, int attempt, int count)
    {
        for (int k = 0; k < count; k += V.Count)
        {
            numbers.Generate(V.Load(Trials + k), V.Load(Items + k), attempt, out V c0, out V c1, out V c2, out V c3);
            V.Store(Uniform.Open(c0, c1), Normals + k);
            V.Store(Uniform.Open(c2, c3), Uniforms + k);
        }
    }

    /// <summary>Replaces normals by candidates, and uniforms by 1 where the candidate is accepted, by 0 where it is not.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void TestAgainstLogarithms(int count)
    {
        V one = V.Create(1);
        for (int k = 0; k < count; k += V.Count)
        {
            V a = V.Load(Shapes + k);
            V d = Offset(a, V.LessThan(a, one));
            V z = V.Load(Normals + k);
            V.Store(Candidate(d, z, out V y), Normals + k);
            V cube = Cube(y);
            V bound = V.FusedMultiplyAdd(V.Create(0.5) * z, z, d * (one - cube + Elementary.Log(cube)));

            // A negative cube has no logarithm: the comparison with NaN is false, and the attempt is rejected as it should be.
            V accepted = V.LessThan(Elementary.Log(V.Load(Uniforms + k)), bound);
            V.Store(accepted & one, Uniforms + k);
        }
    }

    /// <summary>Multiplies the values of shapes below 1 by U^(1/a), with a uniform that belongs to no attempt.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private void Boost(in ItemStream numbers, double* shape, double* target)
    {
        V one = V.Create(1);
        for (int i = 0; i < _trials; i += V.Count)
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
}
