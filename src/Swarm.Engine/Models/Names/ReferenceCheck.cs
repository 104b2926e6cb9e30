using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Names;

/// <summary>Checks what formulas refer to: that every name is known, and that every index exists where it stands.</summary>
/// <param name="names">The model's names.</param>
/// <param name="horizon">Last step; null where it is unknown.</param>
/// <param name="diagnostics">Where mistakes are told.</param>
internal sealed class ReferenceCheck(NameTable names, int? horizon, DiagnosticList diagnostics)
{
    public void Check(Formula formula) => Check(formula.Body, formula.Name.Kind);

    private void Check(Expression expression, QuantityKind where)
    {
        if (diagnostics.IsFull)
        {
            return;
        }

        switch (expression)
        {
            case ReferenceExpression reference:
                Check(reference, where);
                break;
            case UnaryExpression unary:
                Check(unary.Operand, where);
                break;
            case BinaryExpression binary:
                Check(binary.Left, where);
                Check(binary.Right, where);
                break;
            case CallExpression call:
                foreach (Expression argument in call.Arguments)
                {
                    Check(argument, where);
                }

                break;
            case OverStepsExpression reduction:
                Check(reduction);
                break;
        }
    }

    private void Check(OverStepsExpression reduction)
    {
        string word = reduction.Reduction.ToString().ToLowerInvariant();
        if (ExpressionWalk.All(reduction.Operand).OfType<OverStepsExpression>().FirstOrDefault() is { } inner)
        {
            diagnostics.Error(
                inner.Position,
                $"a value over all steps stands inside '{word}'",
                "give the inner one a formula of its own");
            return;
        }

        bool isStepped = ExpressionWalk.All(reduction.Operand)
            .Any(part => part is ReferenceExpression { Index: StepIndex.Current or StepIndex.Previous });
        if (!isStepped)
        {
            diagnostics.Error(
                reduction.Position, $"'{word}' goes over steps, but nothing in it has [t]", $"write {word}(x[t]), where x exists for each step");
        }

        Check(reduction.Operand, QuantityKind.PerStep);
    }

    private void Check(ReferenceExpression reference, QuantityKind where)
    {
        if (names.Find(reference.Name, reference.Index != StepIndex.None) is not { } known)
        {
            ReportUnknown(reference);
        }
        else if (reference.Index == StepIndex.None && known.IsStepped)
        {
            diagnostics.Error(
                reference.Position,
                $"'{reference.Name}' exists for each step and needs an index",
                where == QuantityKind.PerStep ? $"write {reference.Name}[t]" : $"write {reference.Name}[horizon], or sum({reference.Name}[t])");
        }
        else if (reference.Index != StepIndex.None && !known.IsStepped)
        {
            diagnostics.Error(
                reference.Position,
                $"'{reference.Name}' exists once per trial and has no steps",
                $"write {reference.Name}");
        }
        else
        {
            CheckIndex(reference, known, where);
        }
    }

    private void ReportUnknown(ReferenceExpression reference)
    {
        if (!names.MayExist(reference.Name))
        {
            diagnostics.Error(
                reference.Position,
                $"{DiagnosticList.Quote(reference.Name)} is not known",
                Suggestion(reference.Name, names));
        }
    }

    /// <summary>What an unknown name was meant to be.</summary>
    public static string Suggestion(string name, NameTable names)
    {
        string? nearest = NearestName.Of(name, names.All.Select(known => known.Name));
        return nearest is not null
            ? $"did you mean '{nearest}'?"
            : "define it under draws or formulas";
    }

    private void CheckIndex(ReferenceExpression reference, KnownQuantity known, QuantityKind where)
    {
        string name = reference.Name;
        switch (reference.Index)
        {
            case StepIndex.Current or StepIndex.Previous when where == QuantityKind.AtStep:
                diagnostics.Error(reference.Position, "a value before the first step cannot look at [t]", $"write {name}[0]");
                break;
            case StepIndex.Current or StepIndex.Previous when where == QuantityKind.PerTrial:
                diagnostics.Error(
                    reference.Position,
                    $"'{name}[t]' stands in a formula that exists once per trial",
                    $"write {name}[horizon] or sum({name}[t]), or give the formula [t]");
                break;
            case StepIndex.Previous when !known.HasStart:
                ReportStart(reference, known, $"'{name}[t-1]' looks before the first step, where '{name}' has no value");
                break;
            case StepIndex.Fixed when reference.Step == 0 && !known.HasStart:
                ReportStart(reference, known, $"'{name}' has no value at step 0");
                break;
            case StepIndex.Fixed when reference.Step > horizon && horizon > 0:
                diagnostics.Error(
                    reference.Position,
                    $"step {reference.Step} lies beyond the horizon, {horizon}",
                    $"write {name}[horizon] for the last step");
                break;
        }
    }

    private void ReportStart(ReferenceExpression reference, KnownQuantity known, string message) =>
        diagnostics.Error(reference.Position, message, known.Origin == QuantityOrigin.Formula
            ? $"add '{known.Name}[0]: ...'"
            : $"carry it in a formula: last[0]: 0 and last[t]: {known.Name}[t], then last[t-1]");
}
