using System.Globalization;

namespace Swarm.Engine.Reserving;

/// <summary>An origin period as a label names it: a year, or a quarter of one.</summary>
/// <param name="Number">Periods since year 0.</param>
/// <param name="Months">12 for a year, 3 for a quarter.</param>
internal readonly record struct OriginPeriod(int Number, int Months)
{
    public const int Yearly = 12;
    public const int Quarterly = 3;

    private const int YearDigits = 4;
    private const int QuartersPerYear = 4;

    /// <summary>The label: 2017 or 2017Q3.</summary>
    public override string ToString() => Months == Yearly
        ? Number.ToString(CultureInfo.InvariantCulture)
        : string.Create(CultureInfo.InvariantCulture, $"{Number / QuartersPerYear}Q{(Number % QuartersPerYear) + 1}");

    /// <summary>The period in which a date lies.</summary>
    public static OriginPeriod Of(DateOnly date, int months) => months == Yearly
        ? new OriginPeriod(date.Year, months)
        : new OriginPeriod((date.Year * QuartersPerYear) + ((date.Month - 1) / Quarterly), months);

    /// <summary>The last day of the period.</summary>
    public DateOnly LastDay => Months == Yearly
        ? new DateOnly(Number, 12, 31)
        : LastDayOf(Number / QuartersPerYear, ((Number % QuartersPerYear) + 1) * Quarterly);

    /// <summary>Reads 2017 or 2017Q3, and a plain number such as 7 for years that are only numbered; null for anything else.</summary>
    public static OriginPeriod? Parse(string text)
    {
        bool isQuarter = text.Length == YearDigits + 2 && text[YearDigits] is 'Q' or 'q' && text[^1] is >= '1' and <= '4';
        ReadOnlySpan<char> digits = isQuarter ? text.AsSpan(0, YearDigits) : text;
        if (digits.Length is 0 or > YearDigits || digits[0] == '0' || digits.ContainsAnyExceptInRange('0', '9'))
        {
            return null;
        }

        int year = int.Parse(digits, NumberStyles.None, CultureInfo.InvariantCulture);
        return isQuarter ? new OriginPeriod((year * QuartersPerYear) + text[^1] - '1', Quarterly) : new OriginPeriod(year, Yearly);
    }

    private static DateOnly LastDayOf(int year, int month) => new(year, month, DateTime.DaysInMonth(year, month));
}
