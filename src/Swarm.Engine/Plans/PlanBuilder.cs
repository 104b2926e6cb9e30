namespace Swarm.Engine.Plans;

/// <summary>
/// Gathers operations in single-assignment form: each register is written once, equal operations on equal operands share a
/// register, and an operation on constants is carried out at once, by the same kernels.
/// </summary>
internal sealed class PlanBuilder
{
    private readonly Dictionary<Operation, int> _numbering = [];
    private readonly Dictionary<long, int> _constantsByBits = [];

    public List<Operation> Operations { get; } = [];

    public List<double> Constants { get; } = [];

    public List<PlanDraw> Draws { get; } = [];

    public List<PlanComponent> Components { get; } = [];

    public List<FaultSite> FaultSites { get; } = [];

    /// <summary>Number of registers handed out so far.</summary>
    public int Registers { get; private set; }

    public int NewRegister() => Registers++;

    public int Constant(double value)
    {
        long bits = BitConverter.DoubleToInt64Bits(value);
        if (_constantsByBits.TryGetValue(bits, out int register))
        {
            return register;
        }

        Constants.Add(value);
        return _constantsByBits[bits] = ~(Constants.Count - 1);
    }

    public bool IsConstant(int register, out double value)
    {
        value = register < 0 ? Constants[~register] : double.NaN;
        return register < 0;
    }

    /// <summary>The register that holds the result of an operation.</summary>
    public int Apply(OpCode code, int a, int b = Operation.None, int c = Operation.None)
    {
        var operation = new Operation(code, Operation.None, a, b, c);
        if (_numbering.TryGetValue(operation, out int known))
        {
            return known;
        }

        int register = IsFoldable(operation) ? Constant(ConstantFolding.Evaluate(operation, Constants)) : Append(operation);
        _numbering.Add(operation, register);
        return register;
    }

    /// <summary>Adds an operation that has an effect but no result.</summary>
    public void Perform(OpCode code, int a, int b = Operation.None, int c = Operation.None) =>
        Operations.Add(new Operation(code, Operation.None, a, b, c));

    public int AddDraw(PlanDraw draw)
    {
        Draws.Add(draw);
        int register = NewRegister();
        Operations.Add(new Operation(OpCode.Draw, register, Draws.Count - 1));
        return register;
    }

    public void AddComponent(PlanComponent component)
    {
        Components.Add(component);
        Perform(OpCode.Component, Components.Count - 1);
    }

    private static bool IsFoldable(Operation operation) =>
        operation.A < 0 && operation.B is < 0 or Operation.None && operation.C is < 0 or Operation.None;

    private int Append(Operation operation)
    {
        int register = NewRegister();
        Operations.Add(operation with { Target = register });
        return register;
    }
}
