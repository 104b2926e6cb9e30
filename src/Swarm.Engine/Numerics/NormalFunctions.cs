using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

/// <summary>The standard normal distribution function and its inverse.</summary>
internal static partial class NormalFunctions
{
    /// <inheritdoc cref="Cdf{V}(V)"/>
    public static double Cdf(double x) => Cdf(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Quantile{V}(V)"/>
    public static double Quantile(double u) => Quantile(Lanes64.Create(u)).Value;

    /// <summary>
    /// P(Z &lt;= x), within 4 ulp; the lower tail keeps its relative accuracy down to the subnormals. cdf(-inf) = 0, cdf(+inf) = 1.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Cdf<V>(V x)
        where V : unmanaged, ILanes<V>
    {
        // cdf(-a) = exp(-a^2 / 2) d p(d) with d = 1 / (a + 4): the Mills ratio in the variable of Shepherd & Laframboise (1981).
        var a = V.Abs(x);
        a = V.Select(V.LessThan(V.Create(39.0), a), V.Create(39.0), a);
        var d = V.Create(1.0) / (a + V.Create(4.0));
        var p = MillsSeries(d - V.Create(0.13662790697674418)) * d;
        var square = a * a;
        var squareLow = V.FusedMultiplyAdd(a, a, -square);
        var half = V.Create(-0.5);
        var tail = Elementary.ExpOfSum(square * half, squareLow * half, p);
        var result = V.Select(V.LessThan(x, V.Create(0.0)), tail, V.Create(1.0) - tail);
        return V.Select(LaneMath.IsNaN(x), LaneMath.NaN<V>(), result);
    }

    /// <summary>Minimax over d in [1/43, 1/4], relative error below 2^-55.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V MillsSeries<V>(V t)
        where V : unmanaged, ILanes<V>
        => V.Create(-88266357661.08592)
            .Then(t, -19456415589.09398)
            .Then(t, 14859136595.828505)
            .Then(t, 1478743825.6319575)
            .Then(t, -1474772373.9440808)
            .Then(t, 38012368.23200049)
            .Then(t, 113243706.66655988)
            .Then(t, -17529337.76152962)
            .Then(t, -7519285.393296799)
            .Then(t, 2374649.6187821454)
            .Then(t, 484420.0755429014)
            .Then(t, -263102.75560239365)
            .Then(t, -38832.087073992174)
            .Then(t, 28591.7911662689)
            .Then(t, 5393.644577852974)
            .Then(t, -3063.1783576278413)
            .Then(t, -1178.0301681370402)
            .Then(t, 173.9935066581106)
            .Then(t, 259.71478766238073)
            .Then(t, 107.3086717120654)
            .Then(t, 28.31247048597246)
            .Then(t, 5.479691568341166)
            .Then(t, 0.8153383968425169);
}
