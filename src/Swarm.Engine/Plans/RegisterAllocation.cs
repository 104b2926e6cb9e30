namespace Swarm.Engine.Plans;

/// <summary>
/// Gives registers that are never alive together the same column, so that a tile's working set stays in the first caches.
/// Columns are handed out last-freed first: the warmest.
/// </summary>
internal sealed class RegisterAllocation
{
    private readonly int[] _lastUse;
    private readonly int[] _columns;
    private readonly Stack<int> _free = [];

    private RegisterAllocation(int registers)
    {
        _lastUse = new int[registers];
        _columns = new int[registers];
        Array.Fill(_lastUse, -1);
        Array.Fill(_columns, -1);
    }

    /// <summary>Number of columns needed.</summary>
    public int Columns { get; private set; }

    /// <summary>The operations and components with columns in place of registers.</summary>
    public static (Operation[] Operations, PlanComponent[] Components, int Columns) Of(PlanBuilder builder)
    {
        var allocation = new RegisterAllocation(builder.Registers);
        allocation.FindLastUses(builder.Operations);
        var components = new PlanComponent[builder.Components.Count];
        var operations = new Operation[builder.Operations.Count];
        for (int i = 0; i < operations.Length; i++)
        {
            operations[i] = allocation.Place(builder, components, i);
        }

        return (operations, components, allocation.Columns);
    }

    private static IEnumerable<int> Reads(Operation operation) => operation.Code switch
    {
        OpCode.Draw or OpCode.Component => [],
        OpCode.Emit => [operation.A],
        OpCode.CheckFinite => [operation.A, operation.B],
        _ => [operation.A, operation.B, operation.C],
    };

    private static bool IsRegister(int operand) => operand is >= 0 and not Operation.None;

    private void FindLastUses(List<Operation> operations)
    {
        for (int i = 0; i < operations.Count; i++)
        {
            foreach (int register in Reads(operations[i]).Where(IsRegister))
            {
                _lastUse[register] = i;
            }
        }
    }

    private Operation Place(PlanBuilder builder, PlanComponent[] components, int i)
    {
        Operation operation = builder.Operations[i];
        if (operation.Code == OpCode.Component)
        {
            PlanComponent component = builder.Components[operation.A];
            components[operation.A] = component with { Targets = [.. component.Targets.Select(Take)] };
            Free(component.Targets.Where(target => IsRegister(target) && _lastUse[target] < 0));
            return operation;
        }

        // An operand that is read for the last time may be overwritten in place: kernels load a vector before they store it.
        Operation placed = operation.Code == OpCode.Draw ? operation : MapOperands(operation);
        Free(Reads(operation).Where(IsRegister).Distinct().Where(register => _lastUse[register] == i));
        return placed with { Target = Take(operation.Target) };
    }

    private Operation MapOperands(Operation operation) => operation with
    {
        A = Map(operation.A),
        B = operation.Code == OpCode.Emit ? operation.B : Map(operation.B),
        C = operation.Code == OpCode.CheckFinite ? operation.C : Map(operation.C),
    };

    private int Map(int operand) => IsRegister(operand) ? _columns[operand] : operand;

    private int Take(int register)
    {
        if (!IsRegister(register))
        {
            return register;
        }

        return _columns[register] = _free.TryPop(out int column) ? column : Columns++;
    }

    private void Free(IEnumerable<int> registers)
    {
        foreach (int register in registers)
        {
            _free.Push(_columns[register]);
        }
    }
}
