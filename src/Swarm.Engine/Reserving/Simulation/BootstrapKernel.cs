using System.Numerics;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// The residual bootstrap of the over-dispersed Poisson model (England &amp; Verrall 1999, 2002), vectorised across trials.
/// </summary>
internal sealed unsafe class BootstrapKernel<V> : ComponentKernel
    where V : unmanaged, ILanes<V>
{
    // Ten cumulative columns of a kibibyte and their neighbours stay in the first cache.
    private const int Run = 256;

    // The engine stops a run long before this many attempts are ever needed.
    private const int MaxAttempts = 10_000;

    private readonly BootstrapInput _input;
    private readonly PseudoTriangleKernel<V> _pseudo;
    private readonly PseudoTriangleKernel<V> _again;
    private readonly RunOffKernel<V> _runOff;
    private readonly TailFactorKernel<V>? _tail;
    private readonly RunOffSums<V> _sums;

    public BootstrapKernel(BootstrapInput input)
    {
        _input = input;
        _pseudo = new PseudoTriangleKernel<V>(input.Pseudo, Run);
        _again = new PseudoTriangleKernel<V>(input.Pseudo, Run);
        _runOff = new RunOffKernel<V>(input.Pseudo.Shape, input.Process, Run);
        _sums = new RunOffSums<V>(input.Pseudo.Shape, input.Booking, Run);
        _tail = input.Process.Tail is { } tail ? new TailFactorKernel<V>(tail, Run) : null;
    }

    public override void Evaluate(long firstTrial, int trials, int live, double** outputs)
    {
        ulong* residualKeys = stackalloc ulong[3 * Philox4x32.KeyWords];
        ulong* amountKeys = residualKeys + Philox4x32.KeyWords;
        ulong* tailKeys = amountKeys + Philox4x32.KeyWords;
        Philox4x32.ExpandKey(_input.Residuals, residualKeys);
        Philox4x32.ExpandKey(_input.Amounts, amountKeys);
        Philox4x32.ExpandKey(_input.Tail, tailKeys);
        for (int start = 0; start < trials; start += Run)
        {
            _pseudo.Evaluate((nint)residualKeys, firstTrial + start, 0);
            DrawFailedAgain((nint)residualKeys, firstTrial + start, live - start);
            double* tailExcess = _tail is null ? null : _tail.Draw((nint)tailKeys, firstTrial + start);
            _sums.Clear();
            _runOff.Evaluate((nint)amountKeys, firstTrial + start, _pseudo, tailExcess, _sums);
            _sums.Write(outputs, start, Math.Min(Run, trials - start));
        }
    }

    protected override void Release()
    {
        _pseudo.Dispose();
        _again.Dispose();
        _runOff.Dispose();
        _sums.Dispose();
        _tail?.Dispose();
    }

    /// <summary>A pseudo-triangle without a factor is drawn again from the next attempt of its trial's stream.</summary>
    private void DrawFailedAgain(nint keys, long firstTrial, int live)
    {
        for (int attempt = 1; CountFailed(live, out int liveFailed) > 0 && attempt < MaxAttempts; attempt++)
        {
            Redrawn += attempt == 1 ? liveFailed : 0;
            _again.Evaluate(keys, firstTrial, attempt);
            _pseudo.ReplaceFailed(_again);
        }
    }

    private int CountFailed(int live, out int liveFailed)
    {
        int failed = 0;
        liveFailed = 0;
        for (int t = 0; t < Run; t += V.Count)
        {
            ulong bits = V.SignBits(V.Load(_pseudo.Failed + t));
            failed += BitOperations.PopCount(bits);
            int lanes = Math.Clamp(live - t, 0, V.Count);
            liveFailed += BitOperations.PopCount(bits & ((1UL << lanes) - 1));
        }

        return failed;
    }
}
