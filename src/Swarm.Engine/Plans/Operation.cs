namespace Swarm.Engine.Plans;

/// <summary>One operation on columns. Operands are registers: from 0 up columns, below 0 constants (<c>~index</c>).</summary>
internal readonly record struct Operation(OpCode Code, int Target, int A, int B, int C)
{
    /// <summary>Stands for "no operand" and "no target".</summary>
    public const int None = int.MaxValue;

    public Operation(OpCode code, int target, int a, int b = None)
        : this(code, target, a, b, None)
    {
    }
}
