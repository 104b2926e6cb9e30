using System.Runtime.CompilerServices;
using static Swarm.Engine.Numerics.Polynomial;

namespace Swarm.Engine.Numerics;

internal static partial class NormalFunctions
{
    // The central region is u (1 - u) >= e^-5.75 / 4, or 99.8 % of all u.
    private const double CentralLimit = 0.0007956951991274167;
    private const ulong CentralLimitBits = 0x3F4A_12C6_6DCD_95D0;
    private const ulong QuarterBits = 0x3FD0_0000_0000_0000;

    /// <summary>
    /// The z with P(Z &lt;= z) = u, within 3 ulp, for every double u in (0, 1), subnormals included. quantile(0) = -inf,
    /// quantile(1) = +inf, quantile(1/2) = 0, NaN outside [0, 1]. Antisymmetric to the bit where 1 - u is exact.
    /// </summary>
    /// <remarks>
    /// After Giles (2010): z = v p(w) with v = 2u - 1 and w = -log(1 - v^2), which makes one polynomial enough for the central
    /// region. 1 - v^2 = 4 u (1 - u) comes out of one rounding. The logarithm needs only an absolute error of 2^-53, since p is
    /// flat near w = 0.
    /// </remarks>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Quantile<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        var product = V.FusedMultiplyAdd(-u, u, u);
        return LaneMath.AnyOutside(product, CentralLimitBits, QuarterBits) ? QuantileAnywhere(u) : CentralQuantile(u, product);
    }

    /// <summary>
    /// <see cref="Quantile{V}(V)"/>, to the bit, with a cheaper test: for u strictly between 0 and 1 alone, as every uniform
    /// of the streams is.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V QuantileOfOpenUniform<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        var product = V.FusedMultiplyAdd(-u, u, u);
        return V.Any(V.SubtractIntegers(product, V.CreateBits(CentralLimitBits)))
            ? QuantileAnywhere(u)
            : CentralQuantile(u, product);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V CentralQuantile<V>(V u, V product)
        where V : unmanaged, ILanes<V>
        => V.FusedMultiplyAdd(u, V.Create(2.0), V.Create(-1.0)) * CentralSeries(Elementary.LogOfFourfold(product));

    /// <summary>
    /// z / v in -w, minimax: relative error below 2^-53. About w = 0 rather than a centre, which would round w: the terms stay
    /// below 2, the nearest singularity being at w = 2 pi i.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V CentralSeries<V>(V l)
        where V : unmanaged, ILanes<V>
    {
        var l2 = l * l;
        var l4 = l2 * l2;
        return V.Create(1.622159634386052e-19)
            .Over(l4, Four(l, l2, 1.2733703862049002e-13, 9.239421941517018e-15, 4.423936412947781e-16, 1.2619214748358747e-17))
            .Over(l4, Four(l, l2, 9.841803867967394e-11, 3.3994253596300884e-11, 7.830297364777272e-12, 1.2045512238913747e-12))
            .Over(l4, Four(l, l2, -3.0828674648313896e-08, 2.157545873985478e-09, 1.4001426279654513e-09, 2.8887897431979633e-10))
            .Over(l4, Four(l, l2, -6.59183091149338e-05, 2.85726859934684e-06, 1.4330114936163498e-06, -5.1348927953538154e-08))
            .Over(l4, Four(l, l2, -0.3281168738691922, 0.01633323614776268, 0.0033023324201379672, -0.0001810805059478576))
            .Over(l, V.Create(1.2533141373155003));
    }

    // In the tails |z| = y p(1/y - centre) with y = sqrt(w): minimax, relative errors below 2^-53.
    private const double NearCentre = 0.2907354803381361;
    private const double FarCentre = 0.125;
    private const double FarthestCentre = 0.05991484184914842;

    /// <summary>y in [2.395, 6.1]: all that an open uniform reaches.</summary>
    private static ReadOnlySpan<double> NearTail =>
    [
        1.3463886055292877, -0.2674703719166083, 0.19748289185738552, 0.595714562049334, -1.1056298609054094,
        -0.03236079723139628, -5.5030002400672515, 7.93207172007658, 108.82268627605097, 57.17795876527721,
        -2944.847191173563, 194.96287976401265, 73222.65503253475, -125124.37251918993, -1586509.2484708603,
        7427798.281820191, 19249531.329789426, -260416647.30489948, 279656656.20809484, 6027330766.63503,
        -20324726663.29593, -85697453271.4033, 446192617386.7346, 571032093984.2413, -3909574306057.093,
    ];

    /// <summary>y in [6, 12].</summary>
    private static ReadOnlySpan<double> FarTail =>
    [
        1.3924901117736577, -0.2598493411395877, -0.34023145511090686, 1.8367167700291105, -3.885995075809543,
        11.593480937279645, -47.81786712500261, 221.5424458876893, -1107.5225145918334, 5909.877901874062,
        -33121.597714851596, 186023.79900507856, -1099147.024744497, 9311113.554291395, -61252327.21857663,
    ];

    /// <summary>y in [12, 27.4], down to the smallest subnormal.</summary>
    private static ReadOnlySpan<double> FarthestTail =>
    [
        1.4073662504874989, -0.18636822621689675, -0.8522040687539636, 3.8933526877971802, -16.365247273875415,
        109.17539680262378, -916.3096340191681, 8739.842464444158, -91105.41176790971, 1013082.9172679423,
        -11913490.27886043, 145305472.1114667, -1645243125.8871224, 20245998343.811172, -460604136442.8161,
        6574925429104.577,
    ];

    /// <summary>Any u: the tails, the ends, and what is no probability.</summary>
    [MethodImpl(MethodImplOptions.NoInlining | MethodImplOptions.AggressiveOptimization)]
    private static V QuantileAnywhere<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        var zero = V.Create(0.0);
        var one = V.Create(1.0);
        var infinity = V.Create(double.PositiveInfinity);
        var product = V.FusedMultiplyAdd(-u, u, u);
        var v = V.FusedMultiplyAdd(u, V.Create(2.0), -one);

        // Below 2^-53 the factor 1 - u is 1, and u may be subnormal.
        var small = V.LessThan(u, V.Create(1.1102230246251565e-16));
        var logarithm = V.Select(small, Elementary.Log(u) + V.Create(1.3862943611198906), Elementary.LogOfFourfold(product));
        var y = V.Sqrt(-logarithm);
        var inverse = one / y;
        var tail = y * Polynomial.Evaluate(NearTail, inverse - V.Create(NearCentre));
        if (V.Any(V.LessThan(V.Create(6.0), y)))
        {
            var far = y * Polynomial.Evaluate(FarTail, inverse - V.Create(FarCentre));
            var farthest = y * Polynomial.Evaluate(FarthestTail, inverse - V.Create(FarthestCentre));
            far = V.Select(V.LessThan(V.Create(12.0), y), farthest, far);
            tail = V.Select(V.LessThan(V.Create(6.0), y), far, tail);
        }

        var inTail = V.LessThan(product, V.Create(CentralLimit));
        var result = V.Select(inTail, LaneMath.CopySign(tail, v), CentralQuantile(u, product));
        result = V.Select(V.EqualTo(u, zero), -infinity, result);
        result = V.Select(V.EqualTo(u, one), infinity, result);
        return V.Select(V.LessThanOrEqual(zero, u) & V.LessThanOrEqual(u, one), result, LaneMath.NaN<V>());
    }
}
