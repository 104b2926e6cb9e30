namespace Swarm.Engine.Summaries;

/// <summary>The figures of one whole batch: what the spread between batches needs, and no more.</summary>
/// <param name="Moments">The batch's moments.</param>
/// <param name="Exceedances">For each threshold the trials above it.</param>
/// <param name="Var">VaR at each level of <see cref="BatchLevels"/>.</param>
/// <param name="Tvar">TVaR at each level of <see cref="BatchLevels"/>.</param>
public sealed record BatchFigures(
    Moments Moments, IReadOnlyList<long> Exceedances, IReadOnlyList<double> Var, IReadOnlyList<double> Tvar)
{
    internal static BatchFigures Of(OutcomeSummary summary, DigestIndex index, OutcomeRequest request, double[] levels) =>
        Of(summary.Moments, summary.Exceedances.ToArray(), index, request, levels);

    internal static BatchFigures Of(
        Moments moments, long[] exceedances, DigestIndex index, OutcomeRequest request, double[] levels)
    {
        var values = new double[levels.Length];
        var tails = new double[levels.Length];
        for (var i = 0; i < levels.Length; i++)
        {
            values[i] = TailFigures.Var(index, levels[i], request.Adverse);
            tails[i] = TailFigures.Tvar(index, levels[i], request.Adverse);
        }

        return new BatchFigures(moments, exceedances, values, tails);
    }
}
