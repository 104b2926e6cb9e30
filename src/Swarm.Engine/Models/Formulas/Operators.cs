namespace Swarm.Engine.Models.Formulas;

/// <summary>Which step of a quantity a reference means.</summary>
public enum StepIndex
{
    /// <summary>No index: the quantity exists once per trial.</summary>
    None,

    /// <summary><c>x[t]</c>.</summary>
    Current,

    /// <summary><c>x[t-1]</c>.</summary>
    Previous,

    /// <summary><c>x[3]</c>.</summary>
    Fixed,

    /// <summary><c>x[horizon]</c>.</summary>
    Horizon,
}

/// <summary>Operators of one operand.</summary>
public enum UnaryOperator
{
    /// <summary><c>-a</c>.</summary>
    Negate,

    /// <summary><c>not a</c>.</summary>
    Not,
}

/// <summary>Operators of two operands.</summary>
public enum BinaryOperator
{
    /// <summary><c>a + b</c>.</summary>
    Add,

    /// <summary><c>a - b</c>.</summary>
    Subtract,

    /// <summary><c>a * b</c>.</summary>
    Multiply,

    /// <summary><c>a / b</c>.</summary>
    Divide,

    /// <summary><c>a ^ b</c>, to the right first.</summary>
    Power,

    /// <summary><c>a &lt; b</c>.</summary>
    Less,

    /// <summary><c>a &lt;= b</c>.</summary>
    LessOrEqual,

    /// <summary><c>a &gt; b</c>.</summary>
    Greater,

    /// <summary><c>a &gt;= b</c>.</summary>
    GreaterOrEqual,

    /// <summary><c>a == b</c>.</summary>
    Equal,

    /// <summary><c>a != b</c>.</summary>
    NotEqual,

    /// <summary><c>a and b</c>.</summary>
    And,

    /// <summary><c>a or b</c>.</summary>
    Or,
}

/// <summary>Functions of values of one trial and step.</summary>
public enum Function
{
    /// <summary><c>if(condition, a, b)</c>: both may be computed, only the chosen one can fault.</summary>
    If,

    /// <summary>Least of two or more.</summary>
    Min,

    /// <summary>Greatest of two or more.</summary>
    Max,

    /// <summary>Absolute value.</summary>
    Abs,

    /// <summary>e to the power.</summary>
    Exp,

    /// <summary>Natural logarithm.</summary>
    Log,

    /// <summary>Square root.</summary>
    Sqrt,

    /// <summary>Greatest whole number not above.</summary>
    Floor,

    /// <summary><c>clamp(x, low, high)</c>.</summary>
    Clamp,
}

/// <summary>Reductions over steps.</summary>
public enum StepReduction
{
    /// <summary>Sum, in the order of steps.</summary>
    Sum,

    /// <summary>Sum over the number of steps.</summary>
    Mean,

    /// <summary>True if true at any step.</summary>
    Any,

    /// <summary>True if true at every step.</summary>
    All,

    /// <summary>Greatest over steps.</summary>
    Largest,

    /// <summary>Least over steps.</summary>
    Smallest,
}
