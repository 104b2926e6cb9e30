using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary>The shape of a whole document: what the reader checks and what the JSON schema says.</summary>
internal static class ModelShape
{
    public static ObjectShape Document { get; } = new(
        "A model: random inputs, formulas on them, and the outcomes whose distribution is asked.",
        [
            new Field("model", HeadSection.TitleShape) { IsRequired = true },
            new Field("money", HeadSection.MoneyShape),
            new Field("horizon", HeadSection.HorizonShape),
            new Field("draws", DrawsSection.Shape),
            new Field("formulas", FormulasSection.Shape),
            new Field("outcomes", OutcomesSection.Shape) { IsRequired = true },
        ]);
}
