namespace Swarm.Engine.Reserving;

/// <summary>Estimates the scale of the over-dispersed Poisson model.</summary>
internal static class ScaleParameters
{
    private const int LeastResiduals = 2;

    /// <summary>
    /// Scale of a group of cells: n / (n - p) times the mean of their squared Pearson residuals (England &amp; Verrall 2006). Over
    /// all cells that is the sum of squares over n - p.
    /// </summary>
    /// <param name="residuals">Residuals of all known cells; their scaled form is not used.</param>
    /// <param name="form">One scale, or one a development period.</param>
    /// <param name="developments">Number of development periods.</param>
    /// <param name="adjustment">n / (n - p).</param>
    public static IReadOnlyList<ScaleGroup> Of(
        IReadOnlyList<Residual> residuals, ScaleForm form, int developments, double adjustment)
    {
        List<(int First, int Last)> spans = form == ScaleForm.Constant
            ? [(0, developments - 1)]
            : SpansOf(residuals, developments);
        return [.. spans.Select(span => GroupOf(residuals, span.First, span.Last, adjustment))];
    }

    /// <summary>A development period with fewer than two free residuals joins the one before it.</summary>
    private static List<(int First, int Last)> SpansOf(IReadOnlyList<Residual> residuals, int developments)
    {
        List<(int First, int Last)> spans = [];
        for (int j = 0; j < developments; j++)
        {
            bool isFirstShort = spans.Count == 1 && FreeWithin(residuals, spans[0].First, spans[0].Last) < LeastResiduals;
            if (spans.Count > 0 && (isFirstShort || FreeWithin(residuals, j, j) < LeastResiduals))
            {
                spans[^1] = (spans[^1].First, j);
            }
            else
            {
                spans.Add((j, j));
            }
        }

        return spans;
    }

    private static int FreeWithin(IReadOnlyList<Residual> residuals, int first, int last) =>
        residuals.Count(r => r.Development >= first && r.Development <= last && r.IsCounted && !r.IsZeroByConstruction);

    private static ScaleGroup GroupOf(IReadOnlyList<Residual> residuals, int first, int last, double adjustment)
    {
        double squares = 0;
        int count = 0;
        int zeros = 0;
        foreach (Residual residual in residuals)
        {
            if (residual.IsCounted && residual.Development >= first && residual.Development <= last)
            {
                squares += residual.Pearson * residual.Pearson;
                count++;
                zeros += residual.IsZeroByConstruction ? 1 : 0;
            }
        }

        return new ScaleGroup(first, last, count, zeros, adjustment * (squares / count));
    }
}
