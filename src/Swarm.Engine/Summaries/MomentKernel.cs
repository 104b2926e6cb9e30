using System.Runtime.CompilerServices;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Summaries;

/// <summary>
/// The moments of a span by two passes over 8 virtual lanes: lane j holds the positions j modulo 8, whatever the width of the
/// vectors, and the lanes are added up in one fixed tree.
/// </summary>
internal static unsafe class MomentKernel
{
    private const int Virtual = Edition.VirtualLanes;

    public static Moments Of(ReadOnlySpan<double> values, LaneWidth width) => width switch
    {
        LaneWidth.Vector512 => Of<Lanes512>(values),
        LaneWidth.Vector256 => Of<Lanes256>(values),
        LaneWidth.Vector128 => Of<Lanes128>(values),
        _ => Of<Lanes64>(values),
    };

    /// <summary>How many values lie above a threshold; the threshold itself does not count.</summary>
    public static long CountAbove(ReadOnlySpan<double> values, double threshold, LaneWidth width) => width switch
    {
        LaneWidth.Vector512 => CountAbove<Lanes512>(values, threshold),
        LaneWidth.Vector256 => CountAbove<Lanes256>(values, threshold),
        LaneWidth.Vector128 => CountAbove<Lanes128>(values, threshold),
        _ => CountAbove<Lanes64>(values, threshold),
    };

    /// <summary>How many values equal one; -0 equals 0.</summary>
    public static long CountEqual(ReadOnlySpan<double> values, double value, LaneWidth width) => width switch
    {
        LaneWidth.Vector512 => CountEqual<Lanes512>(values, value),
        LaneWidth.Vector256 => CountEqual<Lanes256>(values, value),
        LaneWidth.Vector128 => CountEqual<Lanes128>(values, value),
        _ => CountEqual<Lanes64>(values, value),
    };

    /// <summary>The least and the greatest of at least one value.</summary>
    public static (double Min, double Max) ExtremesOf(ReadOnlySpan<double> values, LaneWidth width)
    {
        var lanes = stackalloc double[Virtual];
        fixed (double* first = values)
        {
            return width switch
            {
                LaneWidth.Vector512 => ExtremesAndSums<Lanes512>(first, values.Length, lanes),
                LaneWidth.Vector256 => ExtremesAndSums<Lanes256>(first, values.Length, lanes),
                LaneWidth.Vector128 => ExtremesAndSums<Lanes128>(first, values.Length, lanes),
                _ => ExtremesAndSums<Lanes64>(first, values.Length, lanes),
            };
        }
    }

    private static Moments Of<T>(ReadOnlySpan<double> values)
        where T : unmanaged, ILanes<T>
    {
        if (values.IsEmpty) return default;
        var lanes = stackalloc double[Virtual * 5];
        fixed (double* first = values)
        {
            var (min, max) = ExtremesAndSums<T>(first, values.Length, lanes);
            var mean = MeanOf(first, values.Length, lanes);
            if (min == max && double.IsFinite(mean)) return new Moments { Count = values.Length, Mean = min, Min = min, Max = min };
            PowerSums<T>(first, values.Length, mean, lanes);
            return new Moments
            {
                Count = values.Length,
                Mean = mean,
                M2 = Tree(lanes),
                M3 = Tree(lanes + Virtual),
                M4 = Tree(lanes + (2 * Virtual)),
                M5 = Tree(lanes + (3 * Virtual)),
                M6 = Tree(lanes + (4 * Virtual)),
                Min = min,
                Max = max,
            };
        }
    }

    /// <summary>The least and greatest value, and the lanes' sums.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static (double Min, double Max) ExtremesAndSums<T>(double* values, int count, double* lanes)
        where T : unmanaged, ILanes<T>
    {
        var whole = count / Virtual * Virtual;
        T low = T.Create(values[0]), high = low, oddLow = low, oddHigh = low;
        for (var lane = 0; lane < Virtual; lane += T.Count)
        {
            var sum = T.Create(0);
            var i = lane;

            // Sums keep their order; the extremes have none, and two of each do not wait for each other.
            for (; i < whole - Virtual; i += 2 * Virtual)
            {
                T x = T.Load(values + i), y = T.Load(values + i + Virtual);
                sum = sum + x + y;
                low = T.Select(T.LessThan(x, low), x, low);
                high = T.Select(T.LessThan(high, x), x, high);
                oddLow = T.Select(T.LessThan(y, oddLow), y, oddLow);
                oddHigh = T.Select(T.LessThan(oddHigh, y), y, oddHigh);
            }

            for (; i < whole; i += Virtual)
            {
                var x = T.Load(values + i);
                sum += x;
                low = T.Select(T.LessThan(x, low), x, low);
                high = T.Select(T.LessThan(high, x), x, high);
            }

            T.Store(sum, lanes + lane);
        }

        low = T.Select(T.LessThan(oddLow, low), oddLow, low);
        high = T.Select(T.LessThan(high, oddHigh), oddHigh, high);
        var ends = stackalloc double[2 * Virtual];
        T.Store(low, ends);
        T.Store(high, ends + Virtual);
        double min = values[0], max = min;
        for (var lane = 0; lane < T.Count; lane++)
        {
            min = ends[lane] < min ? ends[lane] : min;
            max = ends[Virtual + lane] > max ? ends[Virtual + lane] : max;
        }

        for (var i = whole; i < count; i++)
        {
            lanes[i - whole] += values[i];
            min = values[i] < min ? values[i] : min;
            max = values[i] > max ? values[i] : max;
        }

        // Adding +0 turns -0 into +0: which of the equal zeros came first depends on the width.
        return (min + 0.0, max + 0.0);
    }

    private static double MeanOf(double* values, int count, double* lanes)
    {
        var sum = Tree(lanes);
        if (double.IsFinite(sum)) return sum / count;

        // Values near the end of the range: the sum overflows, the mean cannot.
        const double Scale = 1.0 / (1 << 30);
        new Span<double>(lanes, Virtual).Clear();
        for (var i = 0; i < count; i++) lanes[i % Virtual] += values[i] * Scale;
        return Tree(lanes) / count / Scale;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void PowerSums<T>(double* values, int count, double mean, double* lanes)
        where T : unmanaged, ILanes<T>
    {
        var whole = count / Virtual * Virtual;
        var center = T.Create(mean);
        for (var lane = 0; lane < Virtual; lane += T.Count)
        {
            T s2 = T.Create(0), s3 = s2, s4 = s2, s5 = s2, s6 = s2;
            for (var i = lane; i < whole; i += Virtual)
            {
                var d = T.Load(values + i) - center;
                var d2 = d * d;
                var d3 = d2 * d;
                s2 += d2;
                s3 += d3;
                s4 = T.FusedMultiplyAdd(d2, d2, s4);
                s5 = T.FusedMultiplyAdd(d2, d3, s5);
                s6 = T.FusedMultiplyAdd(d3, d3, s6);
            }

            T.Store(s2, lanes + lane);
            T.Store(s3, lanes + Virtual + lane);
            T.Store(s4, lanes + (2 * Virtual) + lane);
            T.Store(s5, lanes + (3 * Virtual) + lane);
            T.Store(s6, lanes + (4 * Virtual) + lane);
        }

        for (var i = whole; i < count; i++)
        {
            var d = values[i] - mean;
            var d2 = d * d;
            var d3 = d2 * d;
            var lane = lanes + (i - whole);
            lane[0] += d2;
            lane[Virtual] += d3;
            lane[2 * Virtual] = Math.FusedMultiplyAdd(d2, d2, lane[2 * Virtual]);
            lane[3 * Virtual] = Math.FusedMultiplyAdd(d2, d3, lane[3 * Virtual]);
            lane[4 * Virtual] = Math.FusedMultiplyAdd(d3, d3, lane[4 * Virtual]);
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static long CountAbove<T>(ReadOnlySpan<double> values, double threshold)
        where T : unmanaged, ILanes<T>
    {
        fixed (double* first = values)
        {
            var limit = T.Create(threshold);
            var counts = T.CreateBits(0);
            var i = 0;

            // A comparison mask is the integer -1, so subtracting it counts.
            for (; i <= values.Length - T.Count; i += T.Count)
                counts = T.SubtractIntegers(counts, T.LessThan(limit, T.Load(first + i)));
            var above = SumOfIntegers(counts);
            for (; i < values.Length; i++) above += first[i] > threshold ? 1 : 0;
            return above;
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static long CountEqual<T>(ReadOnlySpan<double> values, double value)
        where T : unmanaged, ILanes<T>
    {
        fixed (double* first = values)
        {
            var same = T.Create(value);
            var counts = T.CreateBits(0);
            var i = 0;
            for (; i <= values.Length - T.Count; i += T.Count)
                counts = T.SubtractIntegers(counts, T.EqualTo(same, T.Load(first + i)));
            var equal = SumOfIntegers(counts);
            for (; i < values.Length; i++) equal += first[i] == value ? 1 : 0;
            return equal;
        }
    }

    private static long SumOfIntegers<T>(T counts)
        where T : unmanaged, ILanes<T>
    {
        var lanes = stackalloc double[Virtual];
        T.Store(counts, lanes);
        var sum = 0L;
        for (var lane = 0; lane < T.Count; lane++) sum += BitConverter.DoubleToInt64Bits(lanes[lane]);
        return sum;
    }

    private static double Tree(double* lanes) =>
        ((lanes[0] + lanes[4]) + (lanes[2] + lanes[6])) + ((lanes[1] + lanes[5]) + (lanes[3] + lanes[7]));
}
