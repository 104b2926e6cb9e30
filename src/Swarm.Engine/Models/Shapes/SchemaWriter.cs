using System.Text.Json.Nodes;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Shapes;

/// <summary>
/// Writes shapes as JSON Schema. Draft 7, since that is what editors of YAML understand best. A schema sees values as YAML's
/// core schema types them (<c>0.35</c> is a number, <c>35%</c> a text), so numbers and words are allowed in both ways.
/// </summary>
internal static class SchemaWriter
{
    /// <summary>The schema of a document of a shape.</summary>
    public static JsonObject Document(Shape shape, string title)
    {
        JsonObject schema = new() { ["$schema"] = "http://json-schema.org/draft-07/schema#", ["title"] = title };
        foreach (KeyValuePair<string, JsonNode?> property in Of(shape))
        {
            schema[property.Key] = property.Value?.DeepClone();
        }

        return schema;
    }

    private static JsonObject Of(Shape shape)
    {
        JsonObject schema = new() { ["description"] = shape.Help };
        switch (shape)
        {
            case TextShape:
                schema["type"] = Types("string", "number", "boolean");
                schema["minLength"] = 1;
                schema["maxLength"] = ModelBounds.FreeTextLength;
                break;
            case FormulaShape:
                schema["type"] = Types("string", "number");
                schema["minLength"] = 1;
                schema["maxLength"] = ModelBounds.FormulaLength;
                break;
            case DistributionShape:
                schema["type"] = "string";
                schema["pattern"] = @"^\s*[A-Za-z_][A-Za-z0-9_]*\s*\(";
                break;
            case DateShape:
                schema["type"] = "string";
                schema["pattern"] = "^[0-9]{4}-[0-9]{2}-[0-9]{2}$";
                break;
            case NumberShape number:
                schema["anyOf"] = new JsonArray(
                    Number(number),
                    new JsonObject { ["type"] = "string", ["pattern"] = NumberText.Pattern });
                break;
            case ChoiceShape choice:
                AddChoices(schema, choice);
                break;
            case ListShape list:
                schema["type"] = "array";
                schema["items"] = Of(list.Item);
                schema["minItems"] = list.Least;
                schema["maxItems"] = list.Most;
                break;
            case MapShape map:
                schema["type"] = "object";
                schema["patternProperties"] = new JsonObject { [map.Names.Pattern] = Of(map.Value) };
                schema["additionalProperties"] = false;
                schema["minProperties"] = map.Least;
                break;
            case ObjectShape fields:
                AddFields(schema, fields);
                break;
            case ShortOrLongShape either:
                schema["anyOf"] = new JsonArray(Of(either.Short), Of(either.Long));
                break;
        }

        return schema;
    }

    private static JsonArray Types(params string[] types) => [.. types.Select(type => (JsonNode)type)];

    private static JsonObject Number(NumberShape shape)
    {
        JsonObject schema = new() { ["type"] = shape.IsWhole ? "integer" : "number" };
        Add(schema, "minimum", shape.Least);
        Add(schema, "exclusiveMinimum", shape.Above);
        Add(schema, "maximum", shape.Most);
        Add(schema, "exclusiveMaximum", shape.Below);
        return schema;
    }

    private static void Add(JsonObject schema, string key, double? bound)
    {
        if (bound is double value)
        {
            schema[key] = value;
        }
    }

    private static void AddChoices(JsonObject schema, ChoiceShape shape)
    {
        JsonArray words = [.. shape.Choices.Select(choice => (JsonNode)choice.Word)];
        if (shape.IsTruth)
        {
            words = [true, false, "true", "false"];
        }

        schema["description"] = $"{shape.Help} {string.Join(" ", shape.Choices.Select(choice => $"{choice.Word}: {choice.Help}"))}";
        schema["enum"] = words;
    }

    private static void AddFields(JsonObject schema, ObjectShape shape)
    {
        JsonObject properties = [];
        foreach (Field field in shape.Fields)
        {
            properties[field.Key] = Of(field.Shape);
        }

        schema["type"] = shape.MayBeNothing ? Types("object", "null") : "object";
        schema["properties"] = properties;
        schema["additionalProperties"] = false;
        JsonArray required = [.. shape.Fields.Where(field => field.IsRequired).Select(field => (JsonNode)field.Key)];
        if (required.Count > 0)
        {
            schema["required"] = required;
        }

        if (shape.OneOf.Count > 0)
        {
            schema["oneOf"] = new JsonArray([.. shape.OneOf.Select(key => new JsonObject { ["required"] = new JsonArray(key) })]);
        }
    }
}
