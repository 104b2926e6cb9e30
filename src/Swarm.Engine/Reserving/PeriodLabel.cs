using System.Globalization;

namespace Swarm.Engine.Reserving;

/// <summary>Labels of origin and calendar periods: years as <c>2025</c>, quarters as <c>2025Q3</c>.</summary>
public static class PeriodLabel
{
    private const int QuartersPerYear = 4;

    /// <summary>The label a number of periods later.</summary>
    /// <param name="label">A label of either form.</param>
    /// <param name="periods">Number of periods; may be negative.</param>
    /// <exception cref="FormatException">The label is of neither form.</exception>
    public static string Add(string label, int periods)
    {
        int mark = label.IndexOf('Q', StringComparison.OrdinalIgnoreCase);
        if (mark < 0)
        {
            int year = int.Parse(label, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
            return (year + periods).ToString(CultureInfo.InvariantCulture);
        }

        int quarters = (int.Parse(label.AsSpan(0, mark), NumberStyles.None, CultureInfo.InvariantCulture) * QuartersPerYear)
            + int.Parse(label.AsSpan(mark + 1), NumberStyles.None, CultureInfo.InvariantCulture) - 1 + periods;
        return string.Create(CultureInfo.InvariantCulture, $"{quarters / QuartersPerYear}Q{(quarters % QuartersPerYear) + 1}");
    }

    /// <summary>The calendar period of a triangle's latest diagonal.</summary>
    public static string LatestCalendar(Triangle triangle) => Add(triangle.Origins[^1], triangle.Known(triangle.Origins.Count - 1) - 1);
}
