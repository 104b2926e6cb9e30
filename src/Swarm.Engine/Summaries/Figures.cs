namespace Swarm.Engine.Summaries;

/// <summary>From an outcome's result to the figures that are shown, each with its error or the reason why it has none.</summary>
public static class Figures
{
    private const long FewestTrials = 1000;

    /// <summary>The figures of an outcome.</summary>
    public static OutcomeFigures Of(OutcomeResult result, ErrorMethod method)
    {
        var index = DigestIndex.Of(result.Summary.Digest);
        IFigureErrors errors = method == ErrorMethod.Batches
            ? new BatchErrors(result, index)
            : new ClosedFormErrors(result.Request, result.Summary, index);
        return new FigureTable(result, index, errors, ReasonAgainstAll(result, method)).Figures();
    }

    private static string? ReasonAgainstAll(OutcomeResult result, ErrorMethod method) => method switch
    {
        ErrorMethod.Batches when result.Batches.Count < BatchErrors.FewestBatches => FigureReasons.FewBatches(result.Batches.Count),
        ErrorMethod.ClosedForm when result.Summary.Trials < FewestTrials => FigureReasons.FewTrials,
        _ => null,
    };
}
