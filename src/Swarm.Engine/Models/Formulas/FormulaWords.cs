namespace Swarm.Engine.Models.Formulas;

/// <summary>Functions and operators by their spelling.</summary>
internal static class FormulaWords
{
    private const int Many = int.MaxValue;

    /// <summary>Functions of values: how many arguments, and how a call looks.</summary>
    public static IReadOnlyDictionary<string, (Function Function, int Least, int Most, string Form)> Functions { get; } =
        new Dictionary<string, (Function, int, int, string)>(StringComparer.Ordinal)
        {
            ["if"] = (Function.If, 3, 3, "if(condition, a, b)"),
            ["min"] = (Function.Min, 2, Many, "min(a, b)"),
            ["max"] = (Function.Max, 2, Many, "max(a, b)"),
            ["abs"] = (Function.Abs, 1, 1, "abs(x)"),
            ["exp"] = (Function.Exp, 1, 1, "exp(x)"),
            ["log"] = (Function.Log, 1, 1, "log(x)"),
            ["sqrt"] = (Function.Sqrt, 1, 1, "sqrt(x)"),
            ["floor"] = (Function.Floor, 1, 1, "floor(x)"),
            ["clamp"] = (Function.Clamp, 3, 3, "clamp(x, low, high)"),
        };

    /// <summary>Reductions over steps.</summary>
    public static IReadOnlyDictionary<string, StepReduction> Reductions { get; } =
        new Dictionary<string, StepReduction>(StringComparer.Ordinal)
        {
            ["sum"] = StepReduction.Sum,
            ["mean"] = StepReduction.Mean,
            ["any"] = StepReduction.Any,
            ["all"] = StepReduction.All,
            ["largest"] = StepReduction.Largest,
            ["smallest"] = StepReduction.Smallest,
        };

    /// <summary>Operators between two operands; the larger the strength, the tighter they bind.</summary>
    public static IReadOnlyDictionary<string, (BinaryOperator Operator, int Strength)> Operators { get; } =
        new Dictionary<string, (BinaryOperator, int)>(StringComparer.Ordinal)
        {
            ["or"] = (BinaryOperator.Or, Strength.Or),
            ["and"] = (BinaryOperator.And, Strength.And),
            ["<"] = (BinaryOperator.Less, Strength.Comparison),
            ["<="] = (BinaryOperator.LessOrEqual, Strength.Comparison),
            [">"] = (BinaryOperator.Greater, Strength.Comparison),
            [">="] = (BinaryOperator.GreaterOrEqual, Strength.Comparison),
            ["=="] = (BinaryOperator.Equal, Strength.Comparison),
            ["!="] = (BinaryOperator.NotEqual, Strength.Comparison),
            ["+"] = (BinaryOperator.Add, Strength.Sum),
            ["-"] = (BinaryOperator.Subtract, Strength.Sum),
            ["*"] = (BinaryOperator.Multiply, Strength.Product),
            ["/"] = (BinaryOperator.Divide, Strength.Product),
            ["^"] = (BinaryOperator.Power, Strength.Power),
        };

    /// <summary>What to write in place of what other languages write.</summary>
    public static string? HintFor(string text) => text switch
    {
        "**" => "a power is written a ^ b",
        "&&" => "write 'and'",
        "||" => "write 'or'",
        "!" => "write 'not'",
        "<>" => "write '!='",
        "=" => "equality is written '=='",
        "%" => "a percent sign stands right behind a number, as in 7.5%",
        "," => "a decimal point is '.', thousands are parted by '_', as in 1_000.5",
        "\u2212" or "\u2013" => "write '-'",
        "\u00D7" or "\u00B7" => "write '*'",
        "\u2264" => "write '<='",
        "\u2265" => "write '>='",
        "\u2260" => "write '!='",
        "{" or "}" => "group with ( and )",
        "'" or "\"" => "formulas hold no text",
        ";" => "arguments are parted by ','",
        _ => null,
    };

    /// <summary>Binding strengths.</summary>
    internal static class Strength
    {
        public const int Or = 1;
        public const int And = 2;
        public const int Not = 3;
        public const int Comparison = 4;
        public const int Sum = 5;
        public const int Product = 6;
        public const int Negation = 7;
        public const int Power = 8;
    }
}
