using System.Globalization;
using System.Text.Json.Nodes;
using YamlDotNet.Core;
using YamlDotNet.RepresentationModel;

namespace Swarm.Engine.Tests.Models;

/// <summary>Turns YAML into JSON as an editor does that checks it against a schema: plain scalars by YAML 1.2's core schema.</summary>
internal static class YamlAsJson
{
    public static JsonNode? Of(string text)
    {
        YamlStream stream = [];
        stream.Load(new StringReader(text));
        return Of(stream.Documents[0].RootNode);
    }

    private static JsonNode? Of(YamlNode node) => node switch
    {
        YamlMappingNode mapping => new JsonObject(mapping.Children.Select(
            pair => KeyValuePair.Create(((YamlScalarNode)pair.Key).Value!, Of(pair.Value)))),
        YamlSequenceNode sequence => new JsonArray([.. sequence.Children.Select(Of)]),
        YamlScalarNode { Style: ScalarStyle.Plain } scalar => Plain(scalar.Value ?? ""),
        _ => JsonValue.Create(((YamlScalarNode)node).Value),
    };

    private static JsonNode? Plain(string text)
    {
        if (text is "" or "~" or "null" or "Null" or "NULL")
        {
            return null;
        }

        if (text is "true" or "false")
        {
            return text == "true";
        }

        bool looksLikeNumber = text[0] is '-' or '+' or '.' || char.IsAsciiDigit(text[0]);
        return looksLikeNumber && double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number)
            ? number
            : text;
    }
}
