using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary>The shape of a whole document: what the reader checks and what the JSON schema says.</summary>
internal static class ModelShape
{
    private static readonly string[] NamingSections = ["draws", "formulas", "triangles"];

    public static ObjectShape Document { get; } = new(
        "A model: random inputs, formulas on them, and the outcomes whose distribution is asked.",
        [
            new Field("model", HeadSection.TitleShape) { IsRequired = true },
            new Field("money", HeadSection.MoneyShape),
            new Field("horizon", HeadSection.HorizonShape),
            new Field("triangles", TriangleShape.Section),
            new Field("draws", DrawsSection.Shape),
            new Field("formulas", FormulasSection.Shape),
            new Field("outcomes", OutcomesSection.Shape) { IsRequired = true },
        ]);

    /// <summary>
    /// True if a section that declares names cannot be read: it is no mapping, stands under a misspelt key, or lost entries of
    /// its flow style. What refers to unknown names is then passed over, since the fault lies elsewhere.
    /// </summary>
    public static bool LosesNames(MappingNode root) =>
        root.Entries.Any(entry => entry.Value is MappingNode && Document.Fields.All(field => field.Key != entry.Key.Text))
        || NamingSections.Any(key => root[key] is { } section && section is not MappingNode { LostEntries: false });
}
