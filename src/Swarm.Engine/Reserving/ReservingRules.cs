using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>What options a triangle allows, whatever its amounts are.</summary>
internal static class ReservingRules
{
    private const int MaxTailPeriods = 200;

    /// <summary>Adds a finding for each rule that is broken; true if none is.</summary>
    public static bool Hold(Triangle triangle, ReservingOptions options, ICollection<Finding> findings)
    {
        int before = findings.Count;
        if (triangle.Developments < 2)
        {
            findings.Add(Finding.Error(
                "one development period gives no link ratio", "give a triangle with at least two development periods"));
        }

        if (options.LastPeriods is < 1)
        {
            findings.Add(Finding.Error(
                $"the link ratios of the last {options.LastPeriods} periods are asked for", "ask for at least 1, or leave it out"));
        }

        CheckExcluded(triangle, options, findings);
        CheckTail(triangle, options, findings);
        return !findings.Skip(before).Any(finding => finding.Severity == Severity.Error);
    }

    private static void CheckExcluded(Triangle triangle, ReservingOptions options, ICollection<Finding> findings)
    {
        foreach ((int origin, int development) in options.Excluded)
        {
            bool isRatio = origin >= 0 && origin < triangle.Origins.Count
                && development >= 0 && development + 1 < triangle.Known(origin);
            if (!isRatio)
            {
                findings.Add(Finding.Error(
                    $"the excluded link ratio of origin row {origin + 1}, development {development + 1} is not in the triangle",
                    "name the first cell of a link ratio whose two cells are known"));
            }
        }
    }

    private static void CheckTail(Triangle triangle, ReservingOptions options, ICollection<Finding> findings)
    {
        if (options.Tail is not { } tail)
        {
            return;
        }

        if (tail.Factor is { } factor && !(factor > 0 && double.IsFinite(factor)))
        {
            findings.Add(Finding.Error($"the tail factor {factor} is not above 0", "1.01 means 1 % beyond the triangle"));
        }
        else if (tail.Factor is < 1 && options.Method == ReservingMethod.OdpBootstrap)
        {
            findings.Add(Finding.Error(
                $"the tail factor {tail.Factor} is below 1, and the over-dispersed Poisson model has no negative means",
                "use method: mack"));
        }

        if (!(tail.Sd >= 0 && double.IsFinite(tail.Sd)))
        {
            findings.Add(Finding.Error($"the tail's standard deviation {tail.Sd} is below 0", "give 0 or more"));
        }
        else if (tail.Sd > 0 && tail.Factor is 1 && options.Method == ReservingMethod.OdpBootstrap)
        {
            findings.Add(Finding.Error(
                "a tail factor of 1 cannot vary without falling below 1", "give a factor above 1, or a standard deviation of 0"));
        }

        if (tail.Periods is < 1 or > MaxTailPeriods)
        {
            findings.Add(Finding.Error($"the tail is paid over {tail.Periods} periods", $"give 1 to {MaxTailPeriods}"));
        }

        CheckTailAge(triangle, findings);
    }

    /// <summary>Where origins are older than the last column, part of their tail is past and unknown.</summary>
    private static void CheckTailAge(Triangle triangle, ICollection<Finding> findings)
    {
        int origins = triangle.Origins.Count;
        int oldestAge = origins + triangle.Known(origins - 1) - 1;
        if (oldestAge > triangle.Developments)
        {
            findings.Add(Finding.Error(
                $"origin {triangle.Origins[0]} is {oldestAge} periods old but the data end at development {triangle.Developments}: "
                + "what was paid since is not known, so no tail can be added",
                "give the later development periods, or leave the oldest origins or the tail out"));
        }
    }
}
