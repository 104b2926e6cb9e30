using System.Text.Encodings.Web;
using System.Text.Json;
using Swarm.Engine.Models.Sections;
using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models;

/// <summary>The JSON Schema of model documents, for completion and hover text in editors.</summary>
public static class ModelSchema
{
    private static readonly JsonWriterOptions Layout = new()
    {
        Indented = true,
        NewLine = "\n",

        // The schema is a file for people and editors, never part of a page: '<' and '&' may stand as they are.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>The schema as text, as <c>docs/model.schema.json</c> holds it.</summary>
    public static string Text()
    {
        using MemoryStream stream = new();
        using (Utf8JsonWriter writer = new(stream, Layout))
        {
            SchemaWriter.Document(ModelShape.Document, "Swarm model").WriteTo(writer);
        }

        return System.Text.Encoding.UTF8.GetString(stream.ToArray()) + "\n";
    }
}
