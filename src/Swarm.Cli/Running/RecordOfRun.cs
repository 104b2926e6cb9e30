using Swarm.Cli.Inputs;
using Swarm.Engine;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;

namespace Swarm.Cli.Running;

/// <summary>From a finished run to its record.</summary>
internal static class RecordOfRun
{
    public static RunRecord Build(ModelInput input, RunSettings settings, RunOutcome outcome)
    {
        var model = input.Reading.Model!;
        return new RunRecord
        {
            Edition = Edition.Number,
            ToolVersion = Version,
            Seed = settings.Seed,
            Trials = settings.Trials,
            Title = model.Title,
            Money = model.Money,
            Model = input.Source,
            Data = input.Data(),
            Outcomes = outcome.Results,
            Notes = RunNotes.Of(model, outcome),
            Tables = RunTables.Of(model, outcome),
        };
    }

    private static string Version => typeof(RecordOfRun).Assembly.GetName().Version?.ToString(3) ?? "0";
}
