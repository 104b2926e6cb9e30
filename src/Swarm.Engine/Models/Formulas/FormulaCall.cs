using Swarm.Engine.Models.Names;

namespace Swarm.Engine.Models.Formulas;

/// <summary>Finds the function or reduction that a call means, and checks how many arguments it is given.</summary>
internal static class FormulaCall
{
    /// <summary>The expression of a call.</summary>
    /// <param name="name">The function's name.</param>
    /// <param name="arguments">What stands in the brackets.</param>
    /// <param name="position">Where the call begins.</param>
    public static Expression Of(Token name, IReadOnlyList<Expression> arguments, SourcePosition position)
    {
        if (FormulaWords.Reductions.TryGetValue(name.Text, out StepReduction reduction))
        {
            return arguments.Count == 1
                ? new OverStepsExpression(reduction, arguments[0], position)
                : throw new FormulaSyntaxException(
                    name.Start,
                    $"{name.Shown} takes one value with [t], not {arguments.Count}",
                    ReductionHint(name.Text));
        }

        if (!FormulaWords.Functions.TryGetValue(name.Text, out (Function Function, int Least, int Most, string Form) function))
        {
            string[] known = [.. FormulaWords.Functions.Keys, .. FormulaWords.Reductions.Keys];
            string? nearest = NearestName.Of(name.Text, known);
            throw new FormulaSyntaxException(
                name.Start, $"no function is called {name.Shown}",
                nearest is null ? $"known are {string.Join(", ", known)}" : $"did you mean '{nearest}'?");
        }

        return arguments.Count >= function.Least && arguments.Count <= function.Most
            ? new CallExpression(function.Function, arguments, position)
            : throw new FormulaSyntaxException(
                name.Start,
                $"{name.Shown} is given {arguments.Count} {(arguments.Count == 1 ? "argument" : "arguments")}",
                $"write {function.Form}");
    }

    private static string ReductionHint(string name) => name switch
    {
        "sum" => "over values of one trial write a + b + c",
        "mean" => "over values of one trial write (a + b) / 2",
        "largest" => "over values of one trial write max(a, b)",
        "smallest" => "over values of one trial write min(a, b)",
        "any" => "over values of one trial write a or b",
        _ => "over values of one trial write a and b",
    };
}
