namespace Swarm.Engine.Tests.Models;

/// <summary>One document with one entry changed at a time, and whether it is still right.</summary>
internal static class ChangedModels
{
    private const string Triangle =
        """
        model: m
        money: {unit: crown}
        triangles:
          fire:
            data: fire.csv
            amounts: cumulative
            method: mack
        #   ...
        outcomes:
          fire.unpaid: {}
        """;

    private static readonly (string Line, bool IsRight)[] TriangleLines =
    [
        ("layout: square", true),
        ("layout: wide", false),
        ("as_of: 2025-12-31", true),
        ("as_of: yesterday", false),
        ("process: lognormal", true),
        ("process: weibull", false),
        ("tail: {factor: 1.02}", true),
        ("tail: {factor: 102%, sd: 1%, periods: 3}", true),
        ("tail: {factor: 0}", false),
        ("tail: {factor: -1.01}", false),
        ("tail: {sd: 0.01}", false),
        ("tail: {fit: exponential, periods: 5}", true),
        ("tail: {fit: linear}", false),
        ("tail: 1.02", false),
        ("tail: {}", false),
        ("link_ratios: {last: 5}", true),
        ("link_ratios: {last: 2.5}", false),
        ("link_ratios: {last: all}", false),
        ("link_ratios: {average: median}", false),
        ("link_ratios: {exclude: []}", true),
        ("link_ratios: {exclude: [2023]}", false),
        ("link_ratios: {exclude: [{origin: 2023, development: 1}]}", true),
        ("link_ratios: {exclude: [{origin: 2023, development: 0}]}", false),
        ("booked: {best_estimate: 150, by: shift}", true),
        ("booked: {best_estimate: 1.5e2, by: scaling}", true),
        ("booked: {best_estimate: 150}", false),
        ("booked: {best_estimate: 0, by: shift}", false),
        ("booked: 150", false),
        ("columns: {origin: year}", true),
        ("columns: [year, age, paid]", false),
        ("columns: {year: origin}", false),
        ("stream: older", true),
        ("stream: [older]", false),
        ("centred: true", false),
    ];

    private static readonly (string Line, bool IsRight)[] HeadLines =
    [
        ("horizon: 30", true),
        ("horizon: 1_000", true),
        ("horizon: 0", false),
        ("horizon: -3", false),
        ("horizon: 1.5", false),
        ("horizon: 30 years", false),
        ("draws: {}", true),
        ("draws: none", false),
        ("formulas: {}", true),
        ("formulas: []", false),
        ("seed: 1", false),
        ("units: {}", false),
    ];

    public static IEnumerable<(string Text, bool IsRight)> All =>
    [
        .. TriangleLines.Select(change => (Triangle.Replace("#   ...", "    " + change.Line, StringComparison.Ordinal), change.IsRight)),
        .. HeadLines.Select(change => (Triangle.Replace("#   ...", change.Line, StringComparison.Ordinal), change.IsRight)),
    ];
}
