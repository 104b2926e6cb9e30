using Swarm.Engine.Distributions;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Models.Names;
using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary><c>draws</c>: random inputs by name.</summary>
internal static class DrawsSection
{
    private static readonly DistributionShape Distribution = new(
        "A distribution with its parameters by name, as in normal(mean=2%, sd=1.2%). Parameters are constant: numbers or "
        + "arithmetic on numbers. Known are "
        + string.Join("; ", DistributionCatalogue.Forms.Select(form => $"{form.Signature} ({form.Help.TrimEnd('.')})")) + ".");

    public static MapShape Shape { get; } = new(
        "Random inputs. A draw x exists once per trial, x[t] once per step. Its name keys its random numbers, so that they stay the "
        + "same when the rest of the model changes.",
        NameForm.Draw,
        new ShortOrLongShape(
            Distribution.Help,
            Distribution,
            new ObjectShape(
                "A distribution, and options of the draw.",
                [
                    new Field("draw", Distribution) { IsRequired = true },
                    new Field("stream", StreamShape),
                ])));

    /// <summary>The option that lets a renamed draw or component keep its random numbers.</summary>
    public static TextShape StreamShape => new(
        "The name that keys the random numbers, so that a renamed draw or component keeps those of its old name.");

    public static IReadOnlyList<Draw> Read(MappingNode root, ReadingContext context)
    {
        List<Draw> draws = [];
        foreach (MappingEntry entry in root.Entries("draws"))
        {
            if (NameForm.Draw.Read(entry.Key.Text) is not QuantityName name)
            {
                context.Names.Refuse(entry.Key.Text);
                continue;
            }

            context.Names.Declare(name, QuantityOrigin.Draw, entry.Key.Position);
            MappingNode? options = entry.Value as MappingNode;
            ScalarNode? written = options is null ? entry.Value as ScalarNode : options.Scalar("draw");
            if (written is { IsNothing: false } && DistributionCall.Parse(written, context.Diagnostics) is { } call
                && DistributionBinder.Bind(call, context) is { } distribution)
            {
                draws.Add(new Draw(name, distribution, options.Text("stream") ?? name.Name, entry.Key.Position));
            }
        }

        return draws;
    }
}
