using System.Runtime.CompilerServices;
using static Swarm.Engine.Numerics.Polynomial;

namespace Swarm.Engine.Numerics;

/// <summary>The standard normal distribution function and its inverse.</summary>
internal static partial class NormalFunctions
{
    /// <inheritdoc cref="Cdf{V}(V)"/>
    public static double Cdf(double x) => Cdf(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Quantile{V}(V)"/>
    public static double Quantile(double u) => Quantile(Lanes64.Create(u)).Value;

    /// <summary>
    /// P(Z &lt;= x), within 5 ulp; the lower tail keeps its relative accuracy down to the subnormals.
    /// cdf(-inf) = 0, cdf(+inf) = 1.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Cdf<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        // cdf(-a) = exp(-a^2 / 2) d p(d) with d = 1 / (a + 4): the Mills ratio in the variable of Shepherd & Laframboise (1981).
        var a = V.Abs(x);
        a = V.Select(V.LessThan(V.Create(39.0), a), V.Create(39.0), a);

        // Near 0 the rounding of a + 4 would cost 3 ulp: carry what it and the division lose.
        var one = V.Create(1.0);
        var four = V.Create(4.0);
        var sum = a + four;
        var sumLow = a - (sum - four);
        var d = one / sum;
        var dLow = d * V.FusedMultiplyAdd(-sumLow, d, V.FusedMultiplyAdd(-sum, d, one));
        var series = MillsSeries((d - V.Create(0.13662790697674418)) + dLow);
        var p = V.FusedMultiplyAdd(series, d, series * dLow);
        var square = a * a;
        var squareLow = V.FusedMultiplyAdd(a, a, -square);
        var half = V.Create(-0.5);
        var tail = Elementary.ExpOfSum(square * half, squareLow * half, p);
        var result = V.Select(V.LessThan(x, V.Create(0.0)), tail, one - tail);
        return V.Select(LaneMath.IsNaN(x), LaneMath.NaN<V>(), result);
    }

    /// <summary>Minimax over d in [1/43, 1/4], relative error below 2^-55.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V MillsSeries<V>(V t)
        where V : unmanaged, ILanes<V>
    {
        var t2 = t * t;
        var t4 = t2 * t2;
        return Two(t, -19456415589.09398, -88266357661.08592)
            .Over(t4, Four(t, t2, 38012368.23200049, -1474772373.9440808, 1478743825.6319575, 14859136595.828505))
            .Over(t4, Four(t, t2, 2374649.6187821454, -7519285.393296799, -17529337.76152962, 113243706.66655988))
            .Over(t4, Four(t, t2, 28591.7911662689, -38832.087073992174, -263102.75560239365, 484420.0755429014))
            .Over(t4, Four(t, t2, 173.9935066581106, -1178.0301681370402, -3063.1783576278413, 5393.644577852974))
            .Over(t4, Four(t, t2, 5.479691568341166, 28.31247048597246, 107.3086717120654, 259.71478766238073))
            .Over(t, V.Create(0.8153383968425169));
    }
}
