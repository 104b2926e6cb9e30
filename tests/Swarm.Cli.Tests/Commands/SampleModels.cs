namespace Swarm.Cli.Tests.Commands;

/// <summary>Model documents for the tests of commands.</summary>
internal static class SampleModels
{
    public const string Fund = """
        model: Larkfell pension fund, five years
        money: {unit: crown, scale: 1}
        horizon: 5
        draws:
          equity[t]: lognormal(mean=1.07, sd=0.16)
          shock: one_of(values=[-40%, 0%], chances=[0.02, 0.98])
        formulas:
          fund[0]: 1_000_000 * (1 + shock)
          fund[t]: max(0, fund[t-1] * equity[t] - 40_000)
        outcomes:
          fund[horizon]:
            adverse: low
        """;

    public const string TwoMistakes = """
        model: Larkfell, two mistakes
        draws:
          a: normal(mean=1, sdd=2)
        formulas:
          b: aa + 1
        outcomes:
          b: {}
        """;

    public const string Faulting = """
        model: Larkfell, a logarithm of what may be below zero
        draws:
          a: normal(mean=1, sd=2)
        formulas:
          b: log(a)
        outcomes:
          b: {}
        """;
}
