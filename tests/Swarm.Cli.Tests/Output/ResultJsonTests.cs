using System.Text.Json;
using System.Text.Json.Nodes;
using Json.Schema;
using Swarm.Cli.Output;
using Swarm.Cli.Tests.Samples;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Tests.Output;

public sealed class ResultJsonTests(SampleRecord sample) : IClassFixture<SampleRecord>
{
    private static readonly JsonSchema Schema = JsonSchema.FromText(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "output.schema.json")));

    [Theory]
    [InlineData(ErrorMethod.ClosedForm)]
    [InlineData(ErrorMethod.Batches)]
    public void The_document_is_as_its_schema_says(ErrorMethod errors) => Valid(ResultJson.Of(sample.Record, errors));

    [Fact]
    public void A_run_too_small_for_errors_is_as_the_schema_says() => Valid(ResultJson.Of(SampleRuns.Build(500), ErrorMethod.ClosedForm));

    [Fact]
    public void The_schema_refuses_what_the_document_never_holds()
    {
        var document = JsonNode.Parse(ResultJson.Of(sample.Record, ErrorMethod.ClosedForm))!;
        document["outcomes"]![0]!["mean"]!.AsObject().Remove("low");

        Assert.False(Schema.Evaluate(JsonSerializer.SerializeToElement(document)).IsValid);
    }

    [Fact]
    public void Figures_are_written_at_full_precision()
    {
        var document = JsonNode.Parse(ResultJson.Of(sample.Record, ErrorMethod.ClosedForm))!;
        var figures = Figures.Of(sample.Record.Outcomes[0].Result, ErrorMethod.ClosedForm);
        var written = document["outcomes"]![0]!;

        Assert.Equal("motor.unpaid", (string?)written["name"]);
        Assert.Equal(figures.Mean.Value, (double)written["mean"]!["value"]!);
        Assert.Equal(figures.Mean.High, (double)written["mean"]!["high"]!);
        Assert.Equal(figures.Levels[3].Tvar.StandardError, (double)written["levels"]![3]!["tvar"]!["se"]!);
        Assert.Equal(figures.Above[0].Probability.Value, (double)written["above"]![0]!["probability"]!["value"]!);
    }

    [Fact]
    public void Seed_and_digest_are_written_whole()
    {
        var record = sample.Record with { Seed = ulong.MaxValue };
        var document = JsonDocument.Parse(ResultJson.Of(record, ErrorMethod.ClosedForm)).RootElement;

        Assert.Equal(ulong.MaxValue, document.GetProperty("seed").GetUInt64());
        Assert.Equal(record.Digest, document.GetProperty("digest").GetString());
    }

    [Fact]
    public void What_is_no_number_is_null()
    {
        var column = ReportColumn.OfNumbers("numbers", ColumnKind.Number, [1, double.NaN, double.PositiveInfinity]);
        var record = sample.Record with { Tables = [new ReportTable("code", "motor", "title", [column])] };

        var json = ResultJson.Of(record, ErrorMethod.ClosedForm);

        Valid(json);
        var values = JsonNode.Parse(json)!["tables"]![0]!["columns"]![0]!["values"]!.AsArray();
        Assert.Equal([false, true, true], values.Select(value => value is null));
    }

    [Fact]
    public void Unpaid_claims_carry_both_parts_of_their_error()
    {
        var document = JsonNode.Parse(ResultJson.Of(sample.Record, ErrorMethod.ClosedForm))!;
        var whole = document["outcomes"]!.AsArray().Single(outcome => (string?)outcome!["name"] == "motor.unpaid")!;
        var (sd, parameter, process) = (Value(whole, "sd"), Value(whole, "parameter_error"), Value(whole, "process_error"));

        Assert.Equal(sd * sd, (parameter * parameter) + (process * process), 1e-9 * sd * sd);
        Assert.Contains(sample.Record.Outcomes, outcome => outcome.Group == OutcomeGroup.Expected);
    }

    private static double Value(JsonNode outcome, string figure) => (double)outcome[figure]!["value"]!;

    private static void Valid(string json)
    {
        var results = Schema.Evaluate(JsonDocument.Parse(json).RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        var errors = (results.Details ?? []).Where(detail => detail.Errors is not null)
            .Select(detail => $"{detail.InstanceLocation}: {string.Join(", ", detail.Errors!.Values)}");
        Assert.True(results.IsValid, string.Join(Environment.NewLine, errors));
    }
}
