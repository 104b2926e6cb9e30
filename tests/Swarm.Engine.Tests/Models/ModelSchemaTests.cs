using System.Text.Json;
using Json.Schema;
using Swarm.Engine.Models;

namespace Swarm.Engine.Tests.Models;

public class ModelSchemaTests
{
    private static readonly JsonSchema Schema = JsonSchema.FromText(ModelSchema.Text());

    [Fact]
    public void The_schema_in_the_docs_is_the_one_of_the_reader() => RepositoryFile.AssertIs(ModelSchema.Text(), "docs/model.schema.json");

    [Fact]
    public void The_schema_accepts_what_the_reader_accepts()
    {
        foreach (AcceptedModel accepted in AcceptedModel.All)
        {
            Assert.True(Accepts(accepted.Text), accepted.Name);
        }
    }

    [Fact]
    public void The_schema_refuses_what_the_reader_refuses_for_its_structure()
    {
        foreach (RefusedModel refused in RefusedModel.All.Where(r => r.Kind == "structure"))
        {
            Assert.False(Accepts(refused.Text), refused.Name);
        }
    }

    [Fact]
    public void The_schema_cannot_know_what_is_wrong_with_the_meaning()
    {
        foreach (RefusedModel refused in RefusedModel.All.Where(r => r.Kind == "meaning"))
        {
            Assert.True(Accepts(refused.Text), refused.Name);
        }
    }

    [Fact]
    public void Schema_and_reader_agree_on_every_single_change_of_a_document()
    {
        foreach ((string text, bool isRight) in ChangedModels.All)
        {
            Assert.True(Accepts(text) == isRight, "schema: " + text);
            Assert.True(Documents.Read(text).Model is not null == isRight, "reader: " + text);
        }
    }

    [Fact]
    public void Every_place_of_the_schema_has_a_text_to_show()
    {
        using JsonDocument schema = JsonDocument.Parse(ModelSchema.Text());

        AssertDescribed(schema.RootElement.GetProperty("properties"));
    }

    private static void AssertDescribed(JsonElement properties)
    {
        foreach (JsonProperty property in properties.EnumerateObject())
        {
            Assert.True(property.Value.GetProperty("description").GetString()!.Length > 3, property.Name);
            if (property.Value.TryGetProperty("properties", out JsonElement inner))
            {
                AssertDescribed(inner);
            }
        }
    }

    private static bool Accepts(string text)
    {
        using JsonDocument instance = JsonDocument.Parse(YamlAsJson.Of(text)?.ToJsonString() ?? "null");
        return Schema.Evaluate(instance.RootElement).IsValid;
    }
}
