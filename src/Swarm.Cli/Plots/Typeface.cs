using ScottPlot;
using SkiaSharp;

namespace Swarm.Cli.Plots;

/// <summary>The typeface of pictures: the first of a list of plain ones that this machine has.</summary>
internal static class Typeface
{
    private static readonly string[] Preferred = ["Liberation Sans", "DejaVu Sans", "Noto Sans", "Arial", "Helvetica", "Segoe UI"];

    private static readonly Lazy<string[]> Families = new(() => SKFontManager.Default.GetFontFamilies());

    /// <summary>False on a machine without a single font, whose pictures have no text.</summary>
    public static bool IsPresent => Families.Value.Length > 0;

    /// <summary>Makes it the typeface of new pictures.</summary>
    public static void Choose()
    {
        if (Preferred.FirstOrDefault(name => Families.Value.Contains(name)) is { } family) Fonts.Default = family;
    }

    /// <summary>Lets a reader without this machine's typeface fall back to a plain one.</summary>
    public static string WithFallback(string svg) => Families.Value.Aggregate(
        svg, (text, family) => text.Replace($"font-family=\"{family}\"", $"font-family=\"{family}, sans-serif\"", StringComparison.Ordinal));
}
