namespace Swarm.Engine.Models.Names;

/// <summary>
/// A formula, or a part of one that has the same value at every step, as the search for circles sees it. Its instances are its
/// steps; dependencies are kept per unit and not per instance, so that a long horizon costs no memory.
/// </summary>
/// <param name="name">Name to show; null for a part of a formula, which is not shown.</param>
/// <param name="position">Where the formula stands.</param>
internal sealed class DependencyUnit(string? name, SourcePosition position)
{
    public string? Name => name;

    public SourcePosition Position => position;

    /// <summary>Number of its first instance.</summary>
    public int Base { get; set; }

    /// <summary>True if it exists for steps 0..horizon.</summary>
    public bool IsStepped { get; init; }

    /// <summary>First step of a reduction over steps, or null.</summary>
    public int? ReducesFrom { get; init; }

    /// <summary>Units needed at the same step.</summary>
    public List<int> Current { get; } = [];

    /// <summary>Units needed at the step before.</summary>
    public List<int> Previous { get; } = [];

    /// <summary>Instances needed at every step from 1 on.</summary>
    public List<(int Unit, int Step)> Fixed { get; } = [];

    /// <summary>Instances needed at step 0.</summary>
    public List<(int Unit, int Step)> Start { get; } = [];

    /// <summary>The dependency with a number, from 0, of the instance at a step; null behind the last.</summary>
    public (int Unit, int Step)? Dependency(int step, int number, int horizon)
    {
        if (IsStepped && step == 0)
        {
            return number < Start.Count ? Start[number] : null;
        }

        if (number < Fixed.Count)
        {
            return Fixed[number];
        }

        int rest = number - Fixed.Count;
        int perStep = Current.Count + Previous.Count;
        if (ReducesFrom is int first)
        {
            long steps = horizon - first + 1;
            return rest < perStep * steps ? AtStep(rest % perStep, first + (rest / perStep)) : null;
        }

        return rest < perStep ? AtStep(rest, step) : null;
    }

    /// <summary>Dependencies of all its instances together.</summary>
    public long Cost(int horizon) => Fixed.Count + Start.Count
        + ((long)(Current.Count + Previous.Count) * (IsStepped || ReducesFrom is not null ? horizon + 1 : 1));

    private (int Unit, int Step) AtStep(int number, int step) =>
        number < Current.Count ? (Current[number], step) : (Previous[number - Current.Count], step - 1);
}
