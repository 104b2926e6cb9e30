namespace Swarm.Engine.Summaries;

/// <summary>
/// VaR and TVaR of a sample. Where low values hurt, both are those of the sample with its sign turned, turned back: level 99.5 %
/// of a fund looks at its lowest 0.5 %.
/// </summary>
internal static class TailFigures
{
    /// <summary>The lower inverse inf{x: F(x) &gt;= p}.</summary>
    public static double Var(DigestIndex index, double level, Adverse adverse) =>
        index.ValueAt(RankOf(index, level, adverse));

    /// <summary>The average of VaR over the levels from p to 1 (Acerbi &amp; Tasche 2002), which splits an atom at the edge.</summary>
    public static double Tvar(DigestIndex index, double level, Adverse adverse)
    {
        var mass = Ranks.TailMass(level, index.Total);
        if (mass <= 0) return Var(index, level, adverse);
        var mean = index.TailSum(mass, adverse == Adverse.High) / mass;
        var edge = Var(index, level, adverse);

        // The tail's mean cannot fall short of its edge but by rounding; an overflowing sum stays at the extreme.
        return adverse == Adverse.High
            ? Math.Clamp(mean, edge, index.ValueAt(index.Total))
            : Math.Clamp(mean, index.ValueAt(1), edge);
    }

    /// <summary>The rank, counted from below, of the trial that is VaR.</summary>
    public static long RankOf(DigestIndex index, double level, Adverse adverse)
    {
        var rank = Ranks.OfLevel(level, index.Total);
        return adverse == Adverse.High ? rank : index.Total + 1 - rank;
    }
}
