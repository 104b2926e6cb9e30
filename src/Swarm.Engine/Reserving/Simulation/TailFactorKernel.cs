using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>Draws a trial's tail factor, the same for all origins.</summary>
internal sealed unsafe class TailFactorKernel<V>(TailFactorInput input, int trials) : IDisposable
    where V : unmanaged, ILanes<V>
{
    private readonly ColumnMemory _columns = new(1, trials);

    /// <summary>Tail factors less 1.</summary>
    public double* Draw(nint roundKeys, long firstTrial)
    {
        double* excess = _columns[0];
        var numbers = new ItemStream(roundKeys, firstTrial, 0, 0);
        for (int t = 0; t < trials; t += V.Count)
        {
            V.Store(input.LogSd > 0 ? Excess(numbers, firstTrial + t) : V.Create(input.Excess), excess + t);
        }

        return excess;
    }

    public void Dispose() => _columns.Dispose();

    private V Excess(in ItemStream numbers, long trial)
    {
        V index = V.AddIntegers(V.CreateBits((ulong)trial), V.Iota);
        numbers.Generate(index, 0, out V c0, out V c1, out _, out _);
        V z = NormalFunctions.QuantileOfOpenUniform(Uniform.Open(c0, c1));
        return Elementary.Exp(V.FusedMultiplyAdd(V.Create(input.LogSd), z, V.Create(input.LogMean)));
    }
}
