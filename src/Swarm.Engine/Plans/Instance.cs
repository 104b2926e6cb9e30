namespace Swarm.Engine.Plans;

/// <summary>A quantity at a step; <see cref="PerTrial"/> stands for the step of a value that exists once per trial.</summary>
internal readonly record struct Instance(string Name, int Step)
{
    /// <summary>"Step" of a value that exists once per trial.</summary>
    public const int PerTrial = -1;

    public override string ToString() => Step == PerTrial ? Name : $"{Name}[{Step}]";
}
