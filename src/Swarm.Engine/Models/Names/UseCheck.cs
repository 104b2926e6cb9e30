using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Names;

/// <summary>Warns of draws, formulas and components that no outcome needs.</summary>
internal static class UseCheck
{
    public static void Check(Model model, NameTable names, DiagnosticList diagnostics)
    {
        ILookup<string, Formula> formulas = model.Formulas.ToLookup(formula => formula.Name.Name, StringComparer.Ordinal);
        HashSet<string> needed = new(StringComparer.Ordinal);
        Stack<string> open = new(model.Outcomes.Select(outcome => outcome.Name));
        while (open.TryPop(out string? name))
        {
            if (!needed.Add(names.ComponentOf(name) ?? name))
            {
                continue;
            }

            foreach (ReferenceExpression reference in formulas[name].SelectMany(f => ExpressionWalk.All(f.Body)).OfType<ReferenceExpression>())
            {
                open.Push(reference.Name);
            }
        }

        foreach (Draw draw in model.Draws.Where(draw => !needed.Contains(draw.Name.Name)))
        {
            diagnostics.Warning(draw.Position, $"draw '{draw.Name}' reaches no outcome", "report what it is for, or remove it");
        }

        foreach (Formula formula in model.Formulas.Where(f => f.Name.Kind != QuantityKind.AtStep && !needed.Contains(f.Name.Name)))
        {
            diagnostics.Warning(formula.Position, $"formula '{formula.Name}' reaches no outcome", "report it, or remove it");
        }

        foreach (TriangleInput triangle in model.Triangles.Where(triangle => !needed.Contains(triangle.Name)))
        {
            diagnostics.Warning(
                triangle.Position,
                $"triangle '{triangle.Name}' reaches no outcome",
                $"report {triangle.Name}.unpaid, or remove it");
        }
    }
}
