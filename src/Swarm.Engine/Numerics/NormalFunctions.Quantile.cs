using System.Runtime.CompilerServices;

namespace Swarm.Engine.Numerics;

internal static partial class NormalFunctions
{
    private const double CentralLimit = 5.75;

    /// <summary>
    /// The z with P(Z &lt;= z) = u, within 3 ulp, for every double u in (0, 1), subnormals included. quantile(0) = -inf,
    /// quantile(1) = +inf, quantile(1/2) = 0, NaN outside [0, 1].
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V Quantile<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        const ulong BitsOfTwoToMinus53 = 0x3CA0_0000_0000_0000;
        const ulong BitsOfJustBelowOne = 0x3FEF_FFFF_FFFF_FFFF;
        return LaneMath.AnyOutside(u, BitsOfTwoToMinus53, BitsOfJustBelowOne) ? QuantileAnywhere(u) : QuantileOfOpenUniform(u);
    }

    /// <summary>
    /// As <see cref="Quantile{V}(V)"/> for u in [2^-53, 1 - 2^-53] alone, where every uniform of the streams lies. Antisymmetric to
    /// the bit about 1/2 for u = (2k + 1) 2^-53. Garbage outside.
    /// </summary>
    /// <remarks>
    /// After Giles (2010): z = v p(w) with v = 2u - 1 and w = -log(4 u (1 - u)) = -log(1 - v^2), which makes one polynomial enough for w below 5.75,
    /// or 99.8 % of all u. The logarithm needs only an absolute error of 2^-53, since p is flat near w = 0.
    /// </remarks>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static V QuantileOfOpenUniform<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        var v = V.FusedMultiplyAdd(u, V.Create(2.0), V.Create(-1.0));
        var w = -Elementary.LogOfFourfold(V.FusedMultiplyAdd(-u, u, u));
        var z = v * CentralSeries(w - V.Create(CentralLimit / 2));
        return V.Any(V.LessThan(V.Create(CentralLimit), w)) ? WithTails(v, w, z) : z;
    }

    /// <summary>z / v in w - 2.875, minimax: relative error below 2^-53.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static V CentralSeries<V>(V t)
        where V : unmanaged, ILanes<V>
        => V.Create(-1.622159634386052e-19)
            .Then(t, 2.8254259557529586e-18)
            .Then(t, 1.6397789484334243e-18)
            .Then(t, -2.3519471666958567e-16)
            .Then(t, 1.046249255300089e-15)
            .Then(t, 7.25516885835427e-15)
            .Then(t, -9.240417683199782e-14)
            .Then(t, 1.6729440979877066e-13)
            .Then(t, 3.6737170951928146e-12)
            .Then(t, -3.0634875144356644e-11)
            .Then(t, -3.079246792071507e-12)
            .Then(t, 1.6046432557023066e-09)
            .Then(t, -9.722352437971222e-09)
            .Then(t, -2.368697914294389e-08)
            .Then(t, 6.651561017111576e-07)
            .Then(t, -3.042183867263789e-06)
            .Then(t, -1.591747623903788e-05)
            .Then(t, 0.00028647477623336523)
            .Then(t, -0.001323176696881567)
            .Then(t, -0.007645292795788141)
            .Then(t, 0.34368812364578666)
            .Then(t, 2.253196081755608);

    // In the tails z = y p(1/y - centre) with y = sqrt(w): minimax, relative errors below 2^-53.
    private const double NearCentre = 0.2907354803381361;
    private const double FarCentre = 0.125;
    private const double FarthestCentre = 0.05991484184914842;

    /// <summary>y in [2.395, 6.1]: all that an open uniform reaches.</summary>
    private static ReadOnlySpan<double> NearTail =>
    [
        1.3463935057101375, -0.26707254976303324, 0.21157471991710045, 0.8751820251932682, 2.14328491413121,
        19.620319766332294, 7.9436674654222035, -532.274242017784, -1330.7681921373987, 15181.303443647537,
        37213.51502788147, -478246.6206144092, -323694.61256955925, 14208601.32514787, -28410082.883000724,
        -304763831.7708512, 1884289764.3017235, 1245879291.338112, -63516197627.77656, 229002699431.8959,
        1246954656122.1208, -10876335383404.328, -10150451164708.693, 267455648702277.22, -92567098908238.25,
        -3719763612126079.5, 2041172442893897.8, 2.3268213987474788e+16,
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

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static V WithTails<V>(V v, V w, V central)
        where V : unmanaged, ILanes<V>
    {
        var y = V.Sqrt(w);
        var near = y * Polynomial.Evaluate(NearTail, (V.Create(1.0) / y) - V.Create(NearCentre));
        return V.Select(V.LessThan(V.Create(CentralLimit), w), LaneMath.CopySign(near, v), central);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static V QuantileAnywhere<V>(V u)
        where V : unmanaged, ILanes<V>
    {
        var zero = V.Create(0.0);
        var one = V.Create(1.0);
        var infinity = V.Create(double.PositiveInfinity);
        var v = V.FusedMultiplyAdd(u, V.Create(2.0), V.Create(-1.0));
        var small = V.LessThan(u, V.Create(1.1102230246251565e-16));

        // Below 2^-53 the factor 1 - u is 1, and u may be subnormal; other lanes keep the arithmetic of QuantileOfOpenUniform.
        var w = -V.Select(
            small,
            Elementary.Log(u) + V.Create(1.3862943611198906),
            Elementary.LogOfFourfold(V.FusedMultiplyAdd(-u, u, u)));
        var result = WithTails(v, w, v * CentralSeries(w - V.Create(CentralLimit / 2)));
        var y = V.Sqrt(w);
        var inverse = one / y;
        var far = y * Polynomial.Evaluate(FarTail, inverse - V.Create(FarCentre));
        var farthest = y * Polynomial.Evaluate(FarthestTail, inverse - V.Create(FarthestCentre));
        far = V.Select(V.LessThan(V.Create(12.0), y), farthest, far);
        result = V.Select(V.LessThan(V.Create(6.0), y), -far, result);
        result = V.Select(V.EqualTo(u, zero), -infinity, result);
        result = V.Select(V.EqualTo(u, one), infinity, result);
        return V.Select(~(V.LessThanOrEqual(zero, u) & V.LessThanOrEqual(u, one)), LaneMath.NaN<V>(), result);
    }
}
