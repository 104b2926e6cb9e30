using Swarm.Engine.Models;
using Swarm.Engine.Plans;

namespace Swarm.Engine.Tests.Plans;

/// <summary>Models from text, and runs of them.</summary>
internal static class TestModel
{
    public static Model Read(string text)
    {
        ModelReading reading = ModelReader.Read("model.yaml", text, Data);
        return reading.Model ?? throw new InvalidOperationException(string.Join('\n', reading.Diagnostics));
    }

    /// <summary>The triangle of Taylor &amp; Ashe (1983) under any name that ends in csv.</summary>
    private static DataFile? Data(string name)
    {
        if (!name.EndsWith(".csv", StringComparison.Ordinal)) return null;
        string text = string.Join('\n', TestFile.Lines("reserving-taylor-ashe.csv"));
        return new DataFile(name, System.Text.Encoding.UTF8.GetBytes(text));
    }

    public static RunOutcome Run(string text, long trials = 20_000, int threads = 2, ulong seed = 1) =>
        LocalRun.Execute(Read(text), new RunSettings { Seed = seed, Trials = trials, Threads = threads }, null, CancellationToken.None);

    /// <summary>Values of every outcome, one array an outcome, one value a trial.</summary>
    public static unsafe Dictionary<string, double[]> Values(string text, int trials = 512, ulong seed = 1)
    {
        var run = new PreparedRun(Read(text), new RunSettings { Seed = seed, Trials = trials, Threads = 1 });
        using var executor = PlanExecutor.Create(run.Compiled.Running, run.Settings.Width, trials);
        double[] values = new double[run.Outcomes.Count * trials];
        fixed (double* target = values)
        {
            executor.RunTile(0, trials, target, trials);
        }

        return run.Outcomes.Select((outcome, i) => (outcome.Request.Name, Values: values[(i * trials)..((i + 1) * trials)]))
            .ToDictionary(outcome => outcome.Name, outcome => outcome.Values);
    }
}
