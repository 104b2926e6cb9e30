using ScottPlot;

namespace Swarm.Cli.Plots;

/// <summary>Colours that people with any colour vision can tell apart (Okabe &amp; Ito 2008).</summary>
internal static class Palette
{
    public static Color Blue { get; } = Color.FromHex("#0072B2");

    public static Color SkyBlue { get; } = Color.FromHex("#56B4E9");

    public static Color Orange { get; } = Color.FromHex("#E69F00");

    public static Color Vermilion { get; } = Color.FromHex("#D55E00");

    public static Color Green { get; } = Color.FromHex("#009E73");

    public static Color Ink { get; } = Color.FromHex("#222222");

    public static Color Grid { get; } = Color.FromHex("#DDDDDD");
}
