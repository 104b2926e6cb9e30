namespace Swarm.Engine.Plans;

/// <summary>What one operation of a plan does to a column of trials.</summary>
internal enum OpCode
{
    /// <summary>Draws from <see cref="PlanDraw"/> number A.</summary>
    Draw,

    /// <summary>Runs component number A, which writes its own output columns.</summary>
    Component,

    /// <summary>Copies column A to outcome number B.</summary>
    Emit,

    /// <summary>Notes a fault where column A is not finite (and B, if given, is true); C names the <see cref="FaultSite"/>.</summary>
    CheckFinite,

    Add,
    Subtract,
    Multiply,
    Divide,
    Power,
    Less,
    LessOrEqual,
    Equal,
    NotEqual,
    And,
    Or,
    Min,
    Max,
    Negate,
    Not,
    Abs,
    Exp,
    Log,
    Sqrt,
    Floor,

    /// <summary>B where A is true, else C.</summary>
    Select,
}
