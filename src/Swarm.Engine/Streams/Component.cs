using Swarm.Engine.Numerics;

namespace Swarm.Engine.Streams;

/// <summary>
/// A part of a model that turns random streams into several columns at once: a triangle, a book, a fund. It holds what all
/// threads share; each thread has a <see cref="ComponentKernel"/> of its own.
/// </summary>
internal abstract class Component(string name)
{
    /// <summary>Name in the model.</summary>
    public string Name { get; } = name;

    /// <summary>Names of the columns, in the order in which a kernel writes them.</summary>
    public abstract IReadOnlyList<string> Outputs { get; }

    /// <summary>Quantities with a step that are outputs under another name; no output stands for zero.</summary>
    public virtual IEnumerable<(string Name, int Step, string? Output)> Stepped(int horizon) => [];

    /// <summary>A kernel with its own working memory.</summary>
    public abstract ComponentKernel CreateKernel(LaneWidth width);
}

/// <summary>A component's working memory and arithmetic on one thread.</summary>
internal abstract unsafe class ComponentKernel : IDisposable
{
    /// <summary>Writes the columns of a run of trials.</summary>
    /// <param name="firstTrial">First trial, a multiple of 16.</param>
    /// <param name="trials">Number of trials, a multiple of 16.</param>
    /// <param name="live">How many of them belong to the run; the rest is generated and cut.</param>
    /// <param name="outputs">One column an output; null where a column is not used.</param>
    public abstract void Evaluate(long firstTrial, int trials, int live, double** outputs);

    /// <summary>Live trials so far for which the component had to draw again, whatever that means for it.</summary>
    public long Redrawn { get; protected set; }

    /// <inheritdoc/>
    public void Dispose()
    {
        Release();
        GC.SuppressFinalize(this);
    }

    /// <summary>Frees unmanaged memory.</summary>
    protected abstract void Release();
}
