using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Models.Names;
using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary><c>formulas</c>: quantities computed from others.</summary>
internal static class FormulasSection
{
    public static MapShape Shape { get; } = new(
        "Quantities computed from draws, components and each other, in any order. "
        + "x exists once per trial, x[t] at each step 1..horizon, x[0] gives x[t] a value before the first step.",
        NameForm.Formula,
        new FormulaShape(
            "Arithmetic with + - * / ^, comparisons, and, or, not, if(condition, a, b), min, max, abs, "
            + "exp, log, sqrt, floor, clamp(x, low, high), and sum, mean, any, all, largest, smallest over [t]."));

    /// <summary>Formulas that could be parsed; all of them are declared.</summary>
    public static IReadOnlyList<Formula> Read(MappingNode root, ReadingContext context)
    {
        List<Formula> formulas = [];
        foreach (MappingEntry entry in root.Entries("formulas"))
        {
            if (context.Diagnostics.IsFull)
            {
                break;
            }

            if (NameForm.Formula.Read(entry.Key.Text) is not QuantityName name)
            {
                context.Names.Refuse(entry.Key.Text);
                continue;
            }

            context.Names.Declare(name, QuantityOrigin.Formula, entry.Key.Position);
            if (entry.Value is ScalarNode { IsNothing: false } text && FormulaParser.Parse(text, context.Diagnostics) is { } body)
            {
                formulas.Add(new Formula(name, body, entry.Key.Position));
            }
        }

        return formulas;
    }
}
