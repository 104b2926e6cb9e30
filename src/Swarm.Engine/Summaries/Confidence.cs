namespace Swarm.Engine.Summaries;

/// <summary>The 95 % level at which every interval stands, and its quantiles.</summary>
internal static class Confidence
{
    /// <summary>The normal quantile at 97.5 %.</summary>
    public const double Normal = 1.959963984540054;

    /// <summary>
    /// The Student-t quantile at 97.5 % by the expansion of Abramowitz &amp; Stegun (1964), 26.7.5; from 9 degrees of freedom
    /// on good to 0.0001.
    /// </summary>
    public static double StudentT(double degreesOfFreedom)
    {
        const double Z = Normal;
        const double Z2 = Z * Z;
        const double G1 = Z * (Z2 + 1) / 4;
        const double G2 = Z * ((5 * Z2 * Z2) + (16 * Z2) + 3) / 96;
        const double G3 = Z * ((3 * Z2 * Z2 * Z2) + (19 * Z2 * Z2) + (17 * Z2) - 15) / 384;
        const double G4 = Z * ((79 * Z2 * Z2 * Z2 * Z2) + (776 * Z2 * Z2 * Z2) + (1482 * Z2 * Z2) - (1920 * Z2) - 945) / 92160;
        var inverse = 1 / degreesOfFreedom;
        return Z + (inverse * (G1 + (inverse * (G2 + (inverse * (G3 + (inverse * G4)))))));
    }

    /// <summary>Value, error and the interval that lies evenly around it.</summary>
    public static Estimate Even(double value, double standardError, double quantile = Normal) =>
        new(value, standardError, value - (quantile * standardError), value + (quantile * standardError), null);
}
