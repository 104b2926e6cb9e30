using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Plans;

/// <summary>Where the value of an <see cref="Instance"/> comes from.</summary>
internal abstract record Definition;

internal sealed record DrawDefinition(Models.Draw Draw) : Definition;

internal sealed record FormulaDefinition(Expression Body) : Definition;

internal sealed record ComponentDefinition(int Component, int Output) : Definition;

/// <summary>A partial result of a reduction over steps: that of the step before, and the operand at this step.</summary>
internal sealed record AccumulationDefinition(OverStepsExpression Reduction, int FirstStep) : Definition;
