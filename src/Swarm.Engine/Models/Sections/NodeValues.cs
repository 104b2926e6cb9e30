using System.Globalization;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Sections;

/// <summary>
/// Values of nodes whose structure was checked. Null where there is no such entry, or one that was refused already: nothing is
/// told twice.
/// </summary>
internal static class NodeValues
{
    public static MappingNode? Mapping(this MappingNode? node, string key) => node?[key] as MappingNode;

    public static IReadOnlyList<MappingEntry> Entries(this MappingNode? node, string key) => node.Mapping(key)?.Entries ?? [];

    public static ScalarNode? Scalar(this MappingNode? node, string key) => node?[key] is ScalarNode { IsNothing: false } scalar ? scalar : null;

    public static string? Text(this MappingNode? node, string key) => node.Scalar(key)?.Text;

    public static double? Number(this MappingNode? node, string key) => Number(node.Scalar(key));

    public static int? Whole(this MappingNode? node, string key) =>
        node.Number(key) is double value && value == Math.Floor(value) && Math.Abs(value) <= int.MaxValue ? (int)value : null;

    public static bool? Truth(this MappingNode? node, string key) => node.Text(key) switch
    {
        "true" => true,
        "false" => false,
        _ => null,
    };

    public static DateOnly? Day(this MappingNode? node, string key) =>
        DateOnly.TryParseExact(node.Text(key), "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out DateOnly day) ? day : null;

    public static IReadOnlyList<DocumentNode>? Items(this MappingNode? node, string key) => (node?[key] as SequenceNode)?.Items;

    public static double? Number(DocumentNode? node) =>
        node is ScalarNode scalar && NumberText.TryRead(scalar.Text, out double value) ? value : null;
}
