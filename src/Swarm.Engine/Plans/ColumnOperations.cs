using System.Diagnostics;
using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>From an operation's code to its kernel.</summary>
internal static unsafe class ColumnOperations<V>
    where V : unmanaged, ILanes<V>
{
    /// <summary>Computes <paramref name="target"/> from up to three operands.</summary>
    public static void Apply(OpCode code, Operand a, Operand b, Operand c, double* target, int trials)
    {
        switch (code)
        {
            case OpCode.Add: ColumnKernels<V>.Binary<Add>(a, b, target, trials); break;
            case OpCode.Subtract: ColumnKernels<V>.Binary<Subtract>(a, b, target, trials); break;
            case OpCode.Multiply: ColumnKernels<V>.Binary<Multiply>(a, b, target, trials); break;
            case OpCode.Divide: ColumnKernels<V>.Binary<Divide>(a, b, target, trials); break;
            case OpCode.Power: ColumnKernels<V>.Binary<Power>(a, b, target, trials); break;
            case OpCode.Less: ColumnKernels<V>.Binary<Less>(a, b, target, trials); break;
            case OpCode.LessOrEqual: ColumnKernels<V>.Binary<LessOrEqual>(a, b, target, trials); break;
            case OpCode.Equal: ColumnKernels<V>.Binary<Equal>(a, b, target, trials); break;
            case OpCode.NotEqual: ColumnKernels<V>.Binary<NotEqual>(a, b, target, trials); break;
            case OpCode.And: ColumnKernels<V>.Binary<And>(a, b, target, trials); break;
            case OpCode.Or: ColumnKernels<V>.Binary<Or>(a, b, target, trials); break;
            case OpCode.Min: ColumnKernels<V>.Binary<Min>(a, b, target, trials); break;
            case OpCode.Max: ColumnKernels<V>.Binary<Max>(a, b, target, trials); break;
            case OpCode.Negate: ColumnKernels<V>.Unary<Negate>(a, target, trials); break;
            case OpCode.Not: ColumnKernels<V>.Unary<Not>(a, target, trials); break;
            case OpCode.Abs: ColumnKernels<V>.Unary<Abs>(a, target, trials); break;
            case OpCode.Exp: ColumnKernels<V>.Unary<Exp>(a, target, trials); break;
            case OpCode.Log: ColumnKernels<V>.Unary<Log>(a, target, trials); break;
            case OpCode.Sqrt: ColumnKernels<V>.Unary<Sqrt>(a, target, trials); break;
            case OpCode.Floor: ColumnKernels<V>.Unary<Floor>(a, target, trials); break;
            case OpCode.Select: ColumnKernels<V>.Select(a, b, c, target, trials); break;
            default: throw new UnreachableException($"{code} is no function of columns");
        }
    }
}
