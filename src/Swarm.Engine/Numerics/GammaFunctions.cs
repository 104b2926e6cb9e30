namespace Swarm.Engine.Numerics;

/// <summary>The gamma function's logarithm and the regularised incomplete gamma functions, for set-up code and checks.</summary>
internal static class GammaFunctions
{
    private const double HalfLog2Pi = 0.9189385332046728;

    /// <summary>log Gamma(x + 3/2) / ((x + 1/2) (x - 1/2)) for x in [-1/2, 1/2]: minimax, relative error below 2^-59.</summary>
    private static ReadOnlySpan<double> LogGammaSeries =>
    [
        0.4831289505409809, -0.14595989591430608, 0.06291140107456437, -0.03130848750100938, 0.016797098631275872,
        -0.009425622448635372, 0.005446457839038543, -0.00321207406936282, 0.0019229163150614162,
        -0.0011644146797319798, 0.0007115190337004818, -0.0004379918286916905, 0.0002713140449863189,
        -0.00016892806366957075, 0.00010535340747074777, -6.608821585913015e-05, 4.3033497395859526e-05,
        -2.7370709638398212e-05, 1.3175117127709704e-05, -8.054212757082706e-06, 1.214869180839046e-05,
        -7.990127956162265e-06,
    ];

    /// <summary>Bernoulli(2n) / (2n (2n - 1)): Stirling's series.</summary>
    private static ReadOnlySpan<double> StirlingSeries =>
    [
        1.0 / 12, -1.0 / 360, 1.0 / 1260, -1.0 / 1680, 1.0 / 1188, -691.0 / 360360, 1.0 / 156, -3617.0 / 122400,
    ];

    /// <summary>
    /// log Gamma(x) for x above 0, within 6 ulp, near its zeros 1 and 2 too. +inf at 0 and +inf; NaN below 0.
    /// </summary>
    public static double LogGamma(double x)
    {
        if (!(x >= 0))
            return double.NaN;
        if (x == 0)
            return double.PositiveInfinity;
        if (x < 1)
            return BetweenZeros(x, x - 1) - Elementary.Log(x);
        if (x <= 2)
            return BetweenZeros(x - 1, x - 2);
        if (x < 3)
            return BetweenZeros(x - 2, x - 3) + Elementary.Log1p(x - 2);
        return x < 10 ? ByRecurrence(x) : ByStirling(x);
    }

    /// <summary>
    /// P(a, x), the distribution function of a gamma variable of shape a and scale 1, for a above 0; 0 for x at or below 0.
    /// Relative error near 1e-14, growing to 1e-13 in the far lower tail. NaN for a not above 0.
    /// </summary>
    public static double RegularisedLower(double a, double x)
    {
        if (!(a > 0) || double.IsNaN(x))
            return double.NaN;
        if (x <= 0)
            return 0;
        return x < a + 1 ? LowerSeries(a, x) : 1 - UpperFraction(a, x);
    }

    /// <summary>Q(a, x) = 1 - P(a, x), accurate in the upper tail.</summary>
    public static double RegularisedUpper(double a, double x)
    {
        if (!(a > 0) || double.IsNaN(x))
            return double.NaN;
        if (x <= 0)
            return 1;
        return x < a + 1 ? 1 - LowerSeries(a, x) : UpperFraction(a, x);
    }

    /// <summary>log Gamma(1 + p) where q = p - 1, for p in [0, 1].</summary>
    private static double BetweenZeros(double p, double q)
        => p * q * Polynomial.Evaluate(LogGammaSeries, Lanes64.Create(p - 0.5)).Value;

    private static double ByRecurrence(double x)
    {
        var product = 1.0;
        while (x > 2)
        {
            x -= 1;
            product *= x;
        }

        return Elementary.Log(product) + BetweenZeros(x - 1, x - 2);
    }

    private static double ByStirling(double x)
        => double.IsPositiveInfinity(x)
            ? x
            : Math.FusedMultiplyAdd(x - 0.5, Elementary.Log(x) - 1, HalfLog2Pi - 0.5 + StirlingRest(x));

    private static double StirlingRest(double x)
    {
        var inverse = 1 / x;
        return inverse * Polynomial.Evaluate(StirlingSeries, Lanes64.Create(inverse * inverse)).Value;
    }

    /// <summary>
    /// x^a e^-x / Gamma(a + 1) by Loader's saddle point form (2000), which keeps its accuracy for large a.
    /// </summary>
    private static double PoissonTerm(double a, double x)
    {
        var rest = a < 10
            ? LogGamma(a + 1) - ((a + 0.5) * Elementary.Log(a)) + a - HalfLog2Pi
            : StirlingRest(a);
        return Elementary.Exp(-rest - Deviance(a, x)) / (2.5066282746310002 * Math.Sqrt(a));
    }

    /// <summary>a log(a / x) + x - a without cancellation near x = a.</summary>
    private static double Deviance(double a, double x)
    {
        var v = (a - x) / (a + x);
        if (Math.Abs(v) >= 0.1)
            return (a * Elementary.Log(a / x)) + x - a;
        var sum = (a - x) * v;
        var term = 2 * a * v;
        for (var j = 1; ; j++)
        {
            term *= v * v;
            var next = sum + (term / ((2 * j) + 1));
            if (next == sum)
                return sum;
            sum = next;
        }
    }

    private static double LowerSeries(double a, double x)
    {
        var term = 1.0;
        var sum = 1.0;
        for (var n = a + 1; term > sum * 1e-17; n++)
        {
            term *= x / n;
            sum += term;
        }

        return PoissonTerm(a, x) * sum;
    }

    /// <summary>Legendre's continued fraction by the modified method of Lentz (1976).</summary>
    private static double UpperFraction(double a, double x)
    {
        if (double.IsPositiveInfinity(x))
            return 0;
        const double Tiny = 1e-300;
        var b = x + 1 - a;
        var c = 1 / Tiny;
        var d = 1 / b;
        var fraction = d;
        for (var i = 1; ; i++)
        {
            var numerator = -i * (i - a);
            b += 2;
            d = (numerator * d) + b;
            d = 1 / (Math.Abs(d) < Tiny ? Tiny : d);
            c = b + (numerator / c);
            c = Math.Abs(c) < Tiny ? Tiny : c;
            var factor = c * d;
            fraction *= factor;
            if (Math.Abs(factor - 1) < 1e-15)
                return PoissonTerm(a, x) * a * fraction;
        }
    }
}
