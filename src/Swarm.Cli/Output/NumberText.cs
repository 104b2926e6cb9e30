using System.Globalization;

namespace Swarm.Cli.Output;

/// <summary>Numbers for people: rounded at a decimal place, thousands parted by commas.</summary>
internal static class NumberText
{
    private const int MostDecimals = 9;
    private const double Largest = 1e15;

    /// <summary>A number rounded to a multiple of ten to the power of <paramref name="place"/>.</summary>
    public static string AtPlace(double value, int place)
    {
        if (!double.IsFinite(value)) return value.ToString(CultureInfo.InvariantCulture);
        if (Math.Abs(value) >= Largest || (place < -MostDecimals && value != 0)) return Scientific(value, place);
        var decimals = Math.Clamp(-place, 0, MostDecimals);
        var rounded = place > 0 ? Math.Round(value / PowerOfTen(place)) * PowerOfTen(place) : Math.Round(value, decimals);

        // Adding zero turns -0 into 0.
        return (rounded + 0.0).ToString($"N{decimals}", CultureInfo.InvariantCulture);
    }

    /// <summary>A number that has no error to be rounded by: five significant digits, whole digits always kept, no trailing zeros.</summary>
    public static string Plain(double value)
    {
        var decimals = 4 - Magnitude(value);
        if (!double.IsFinite(value) || Math.Abs(value) >= Largest || decimals > MostDecimals + 4) return AtPlace(value, -decimals);
        return Short(Math.Round(value, Math.Clamp(decimals, 0, MostDecimals)) + 0.0);
    }

    /// <summary>A number without trailing zeros, as a person would write it: thresholds, levels.</summary>
    public static string Short(double value) => Math.Abs(value) is >= Largest or (> 0 and < 1e-9)
        ? value.ToString("G6", CultureInfo.InvariantCulture)
        : value.ToString("#,##0.#########", CultureInfo.InvariantCulture);

    /// <summary>A share of one as per cent, as a person would write it: 99.5 %.</summary>
    public static string Percent(double share) => $"{Short(Math.Round(share * 100, MostDecimals))} %";

    /// <summary>A whole number.</summary>
    public static string Count(long value) => value.ToString("N0", CultureInfo.InvariantCulture);

    /// <summary>The exponent of the first significant digit; 0 for zero.</summary>
    public static int Magnitude(double value) =>
        value == 0 || !double.IsFinite(value) ? 0 : (int)Math.Floor(Math.Log10(Math.Abs(value)));

    private static string Scientific(double value, int place)
    {
        var digits = Math.Clamp(Magnitude(value) - place, 1, 12);
        return value.ToString($"0.{new string('0', digits)}e+0", CultureInfo.InvariantCulture);
    }

    private static double PowerOfTen(int exponent) => Math.Pow(10, exponent);
}
