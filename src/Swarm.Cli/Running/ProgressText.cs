using System.Globalization;
using Swarm.Cli.Output;
using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Running;

/// <summary>How far a run is, in two lines: a bar with rate and time left, and the first outcome's figures as they settle.</summary>
internal static class ProgressText
{
    private const int BarCells = 24;
    private const double LongestSeconds = 1000.0 * 24 * 3600;

    /// <summary>The bar, the rate, and the time left.</summary>
    public static string Bar(RunProgress progress, TimeSpan elapsed)
    {
        var share = (double)progress.TrialsDone / progress.Trials;
        var full = (int)(share * BarCells);
        var bar = new string('█', full).PadRight(BarCells, '░');
        var left = Clock(elapsed.TotalSeconds * (1 - share) / share);
        return $"{bar} {share.ToString("P0", CultureInfo.InvariantCulture),5}  {Rate(progress.TrialsDone, elapsed)}  {left} left";
    }

    /// <summary>The mean and the VaR at the highest asked level.</summary>
    public static string Figures(OutcomeFigures figures)
    {
        var top = figures.Levels.Count == 0 ? null : figures.Levels.MaxBy(level => level.P);
        var tail = top is null ? "" : $"   VaR {NumberText.Percent(top.P)} {FigureText.Of(top.Var).Joined}";
        return $"{figures.Name}: mean {FigureText.Of(figures.Mean).Joined}{tail}";
    }

    /// <summary>What a finished run took.</summary>
    public static string Closing(long trials, TimeSpan elapsed) =>
        $"{NumberText.Count(trials)} trials in {elapsed.TotalSeconds.ToString("0.0", CultureInfo.InvariantCulture)} s, {Rate(trials, elapsed)}";

    private static string Rate(long trials, TimeSpan elapsed)
    {
        var rate = elapsed > TimeSpan.Zero ? trials / elapsed.TotalSeconds : 0;
        return rate >= 1e6
            ? $"{(rate / 1e6).ToString("0.00", CultureInfo.InvariantCulture)} million trials/s"
            : $"{NumberText.Count((long)rate)} trials/s";
    }

    private static string Clock(double seconds)
    {
        var time = TimeSpan.FromSeconds(Math.Min(seconds, LongestSeconds));
        if (time.TotalDays >= 2) return seconds > LongestSeconds ? "years" : $"{NumberText.Count((long)time.TotalDays)} days";
        return time.TotalHours >= 1
            ? $"{(long)time.TotalHours}:{time:mm\\:ss}"
            : time.ToString("m\\:ss", CultureInfo.InvariantCulture);
    }
}
