using System.Runtime.InteropServices;

namespace Swarm.Engine.Numerics;

/// <summary>Columns of equal length on cache-line borders, for a kernel's working values.</summary>
internal sealed unsafe class ColumnMemory : IDisposable
{
    private const int CacheLine = 64;
    private readonly double* _start;
    private readonly int _trials;

    /// <param name="columns">Number of columns.</param>
    /// <param name="trials">Length of a column, a multiple of 8.</param>
    public ColumnMemory(int columns, int trials)
    {
        _trials = trials;
        nuint bytes = (nuint)columns * (nuint)trials * sizeof(double);
        _start = (double*)NativeMemory.AlignedAlloc(bytes, CacheLine);
        NativeMemory.Clear(_start, bytes);
    }

    /// <summary>The column with a number.</summary>
    public double* this[int column] => _start + ((nint)column * _trials);

    public void Dispose() => NativeMemory.AlignedFree(_start);
}
