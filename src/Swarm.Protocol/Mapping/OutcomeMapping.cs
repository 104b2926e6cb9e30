using Swarm.Engine.Plans;
using Swarm.Engine.Summaries;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Mapping;

/// <summary>Outcomes of a run record.</summary>
internal static class OutcomeMapping
{
    public static Proto.RecordedOutcome ToMessage(ReportedResult outcome)
    {
        var message = new Proto.RecordedOutcome
        {
            Request = ToMessage(outcome.Result.Request),
            IsMoney = outcome.IsMoney,
            Group = ToMessage(outcome.Group),
            Parent = outcome.Parent,
            Label = outcome.Label,
            Summary = SummaryMapping.ToMessage(outcome.Result.Summary),
            TrialsPerBatch = (ulong)outcome.Result.TrialsPerBatch,
        };
        message.Batches.AddRange(outcome.Result.Batches.Select(SummaryMapping.ToMessage));
        return message;
    }

    public static ReportedResult FromMessage(Proto.RecordedOutcome message, long trials)
    {
        var request = FromMessage(Expect.Present(message.Request, "an outcome's request"));
        var summary = SummaryMapping.FromMessage(Expect.Present(message.Summary, "an outcome's summary"), request.Thresholds.Count);
        Expect.That(summary.Trials == trials, $"{request.Name} has {summary.Trials} trials, the run {trials}");
        var perBatch = Expect.Count(message.TrialsPerBatch, "the size of a batch");
        Expect.That(perBatch > 0 && message.Batches.Count <= trials / perBatch, $"{request.Name} has batches of more trials than the run");
        var levels = BatchLevels.For(request).Length;
        BatchFigures[] batches =
            [.. message.Batches.Select(batch => SummaryMapping.FromMessage(batch, levels, request.Thresholds.Count))];
        Expect.That(batches.All(batch => batch.Moments.Count == perBatch), $"{request.Name} has a batch that is not whole");
        var result = new OutcomeResult(request, summary, perBatch, batches);
        return new ReportedResult(result, FromMessage(message.Group), message.Parent, message.Label, message.IsMoney);
    }

    private static Proto.OutcomeRequest ToMessage(OutcomeRequest request)
    {
        var message = new Proto.OutcomeRequest
        {
            Name = request.Name,
            Adverse = request.Adverse == Adverse.Low ? Proto.Adverse.Low : Proto.Adverse.High,
        };
        message.Levels.AddRange(request.Levels);
        message.Thresholds.AddRange(request.Thresholds);
        return message;
    }

    private static OutcomeRequest FromMessage(Proto.OutcomeRequest message)
    {
        Expect.That(message.Name.Length > 0, "an outcome has no name");
        Expect.That(message.Levels.All(level => level is > 0 and < 1), $"{message.Name} has a level outside 0 to 1");
        Expect.Finite(message.Thresholds, $"a threshold of {message.Name}");
        var adverse = message.Adverse switch
        {
            Proto.Adverse.High => Adverse.High,
            Proto.Adverse.Low => Adverse.Low,
            _ => throw new InvalidDataException($"{message.Name} does not say which end hurts"),
        };
        return new OutcomeRequest(message.Name, adverse, [.. message.Levels], [.. message.Thresholds]);
    }

    private static Proto.OutcomeGroup ToMessage(OutcomeGroup group) => group switch
    {
        OutcomeGroup.Whole => Proto.OutcomeGroup.Whole,
        OutcomeGroup.Step => Proto.OutcomeGroup.Step,
        OutcomeGroup.Origin => Proto.OutcomeGroup.Origin,
        OutcomeGroup.Calendar => Proto.OutcomeGroup.Calendar,
        OutcomeGroup.Expected => Proto.OutcomeGroup.Expected,
        _ => throw new ArgumentOutOfRangeException(nameof(group)),
    };

    private static OutcomeGroup FromMessage(Proto.OutcomeGroup group) => group switch
    {
        Proto.OutcomeGroup.Whole => OutcomeGroup.Whole,
        Proto.OutcomeGroup.Step => OutcomeGroup.Step,
        Proto.OutcomeGroup.Origin => OutcomeGroup.Origin,
        Proto.OutcomeGroup.Calendar => OutcomeGroup.Calendar,
        Proto.OutcomeGroup.Expected => OutcomeGroup.Expected,
        _ => throw new InvalidDataException("an outcome belongs to no known group"),
    };
}
