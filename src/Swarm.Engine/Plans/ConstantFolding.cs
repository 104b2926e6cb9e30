using Swarm.Engine.Numerics;

namespace Swarm.Engine.Plans;

/// <summary>Carries out an operation on constants with the kernels that a run uses, so that folding cannot move a bit.</summary>
internal static unsafe class ConstantFolding
{
    public static double Evaluate(Operation operation, IReadOnlyList<double> constants)
    {
        double a = constants[~operation.A];
        double b = operation.B == Operation.None ? 0 : constants[~operation.B];
        double c = operation.C == Operation.None ? 0 : constants[~operation.C];
        double result;
        ColumnOperations<Lanes64>.Apply(
            operation.Code, new Operand(&a, true), new Operand(&b, true), new Operand(&c, true), &result, 1);
        return result;
    }
}
