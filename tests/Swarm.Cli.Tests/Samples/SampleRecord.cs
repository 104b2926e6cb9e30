using Swarm.Engine.Records;

namespace Swarm.Cli.Tests.Samples;

/// <summary>One run that the tests of a class read.</summary>
public sealed class SampleRecord
{
    internal RunRecord Record { get; } = SampleRuns.Build(20_000);
}
