namespace Swarm.Engine.Models.Formulas;

/// <summary>A parsed formula or a part of one. Booleans are numbers: 1 for true, 0 for false.</summary>
/// <param name="Position">Where it begins in the document.</param>
public abstract record Expression(SourcePosition Position);

/// <summary>A number as written; <c>7.5%</c> is 0.075.</summary>
public sealed record NumberExpression(double Value, SourcePosition Position) : Expression(Position);

/// <summary>A quantity by its name, at a step or once per trial.</summary>
/// <param name="Name">Dotted name without its index.</param>
/// <param name="Index">Which step.</param>
/// <param name="Step">The step of <see cref="StepIndex.Fixed"/>, else 0.</param>
/// <param name="Position">Where the name begins.</param>
public sealed record ReferenceExpression(string Name, StepIndex Index, int Step, SourcePosition Position) : Expression(Position);

/// <summary>Minus or not.</summary>
public sealed record UnaryExpression(UnaryOperator Operator, Expression Operand, SourcePosition Position) : Expression(Position);

/// <summary>Arithmetic, comparison, and, or.</summary>
public sealed record BinaryExpression(BinaryOperator Operator, Expression Left, Expression Right, SourcePosition Position)
    : Expression(Position);

/// <summary>A function of values of one trial and step: if, min, max, abs, exp, log, sqrt, floor, clamp.</summary>
public sealed record CallExpression(Function Function, IReadOnlyList<Expression> Arguments, SourcePosition Position)
    : Expression(Position);

/// <summary>A reduction over every step of its operand, step 0 included where all that it refers to has one.</summary>
public sealed record OverStepsExpression(StepReduction Reduction, Expression Operand, SourcePosition Position) : Expression(Position);
