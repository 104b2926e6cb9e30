using Swarm.Engine.Summaries;

namespace Swarm.Engine.Records;

/// <summary>
/// The standard deviation of an outcome taken apart by the law of total variance: what the parameters' uncertainty gives (the
/// spread of the conditional mean), and what the process adds to it.
/// </summary>
/// <param name="Parameter">Standard deviation of the conditional mean.</param>
/// <param name="Process">Root of the mean conditional variance.</param>
public readonly record struct ErrorParts(Estimate Parameter, Estimate Process)
{
    private const int FewestBatches = 20;

    /// <summary>The parts of an outcome.</summary>
    /// <param name="whole">The outcome.</param>
    /// <param name="expected">Its conditional mean, from the same trials.</param>
    /// <param name="method">Where the standard error of the parameter part comes from; the process part's comes from batches.</param>
    public static ErrorParts Of(OutcomeResult whole, OutcomeResult expected, ErrorMethod method) =>
        new(Figures.Of(expected, method).Sd, ProcessPart(whole, expected));

    private static Estimate ProcessPart(OutcomeResult whole, OutcomeResult expected)
    {
        var value = ProcessSd(whole.Summary.Moments, expected.Summary.Moments);
        var batches = whole.Batches.Count;
        if (batches < FewestBatches) return Estimate.Without(value, $"fewer than {FewestBatches} whole batches ({batches})");
        var squares = 0.0;
        for (var i = 0; i < batches; i++)
        {
            var deviation = ProcessSd(whole.Batches[i].Moments, expected.Batches[i].Moments) - value;
            squares += deviation * deviation;
        }

        // A batch is one of n / m parts of the run, so its figure varies by the root of that more than the run's.
        var variance = squares / (batches - 1) * whole.TrialsPerBatch / whole.Summary.Trials;
        return Confidence.Even(value, Math.Sqrt(variance), Confidence.StudentT(batches - 1));
    }

    private static double ProcessSd(in Moments whole, in Moments expected) =>
        Math.Sqrt(Math.Max(0, (whole.Sd * whole.Sd) - (expected.Sd * expected.Sd)));
}
