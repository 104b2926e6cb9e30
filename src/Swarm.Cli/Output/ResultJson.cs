using System.Buffers;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using Swarm.Engine.Plans;
using Swarm.Engine.Records;
using Swarm.Engine.Summaries;

namespace Swarm.Cli.Output;

/// <summary>A run record as one JSON document at full precision; docs/output.schema.json describes it.</summary>
internal sealed class ResultJson
{
    private static readonly JsonWriterOptions Layout = new()
    {
        Indented = true,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
        NewLine = "\n",
    };

    private readonly Utf8JsonWriter _json;
    private readonly RunRecord _record;
    private readonly ErrorMethod _errors;

    private ResultJson(Utf8JsonWriter json, RunRecord record, ErrorMethod errors) => (_json, _record, _errors) = (json, record, errors);

    /// <summary>The document.</summary>
    public static string Of(RunRecord record, ErrorMethod errors)
    {
        var bytes = new ArrayBufferWriter<byte>();
        using (var json = new Utf8JsonWriter(bytes, Layout)) new ResultJson(json, record, errors).WriteDocument();
        return Encoding.UTF8.GetString(bytes.WrittenSpan);
    }

    private void WriteDocument()
    {
        _json.WriteStartObject();
        _json.WriteString("model", _record.Title);
        _json.WriteNumber("seed", _record.Seed);
        _json.WriteNumber("trials", _record.Trials);
        _json.WriteNumber("edition", _record.Edition);
        _json.WriteString("digest", _record.Digest);
        _json.WriteString("tool", _record.ToolVersion);
        _json.WriteString("file", _record.Model.Name);
        _json.WriteString("errors", _errors == ErrorMethod.Batches ? "batches" : "closed-form");
        if (_record.Money is { } money)
        {
            _json.WriteStartObject("money");
            _json.WriteString("unit", money.Unit);
            _json.WriteNumber("scale", money.Scale);
            _json.WriteEndObject();
        }

        WriteArray("outcomes", _record.Outcomes, WriteOutcome);
        WriteArray("notes", _record.Notes, WriteNote);
        WriteArray("tables", _record.Tables, WriteTable);
        _json.WriteEndObject();
    }

    private void WriteOutcome(ReportedResult outcome)
    {
        var figures = Figures.Of(outcome.Result, _errors);
        _json.WriteStartObject();
        _json.WriteString("name", figures.Name);
        _json.WriteString("group", outcome.Group.ToString().ToLowerInvariant());
        _json.WriteString("parent", outcome.Parent);
        _json.WriteString("label", outcome.Label);
        _json.WriteString("adverse", outcome.Result.Request.Adverse == Adverse.Low ? "low" : "high");
        _json.WriteBoolean("is_money", outcome.IsMoney);
        WriteFigure("mean", figures.Mean);
        WriteFigure("sd", figures.Sd);
        WriteFigure("skewness", figures.Skewness);
        if (Chance.Of(outcome.Result, outcome.IsMoney, _errors) is { } probability) WriteFigure("probability", probability);
        WriteParts(outcome);
        WriteNumber("min", figures.Min);
        WriteNumber("max", figures.Max);
        WriteArray("levels", figures.Levels, level =>
        {
            _json.WriteStartObject();
            WriteNumber("p", level.P);
            WriteFigure("var", level.Var);
            WriteFigure("tvar", level.Tvar);
            _json.WriteEndObject();
        });
        WriteArray("above", figures.Above, above =>
        {
            _json.WriteStartObject();
            WriteNumber("threshold", above.Threshold);
            WriteFigure("probability", above.Probability);
            _json.WriteEndObject();
        });
        _json.WriteEndObject();
    }

    private void WriteParts(ReportedResult outcome)
    {
        var expected = _record.Outcomes.FirstOrDefault(part => part.Group == OutcomeGroup.Expected && part.Parent == outcome.Parent);
        if (outcome.Group != OutcomeGroup.Whole || expected is null) return;
        var parts = ErrorParts.Of(outcome.Result, expected.Result, _errors);
        WriteFigure("parameter_error", parts.Parameter);
        WriteFigure("process_error", parts.Process);
    }

    private void WriteNote(Note note)
    {
        _json.WriteStartObject();
        _json.WriteString("code", note.Code);
        _json.WriteString("text", note.Text);
        if (note.Number is { } number) WriteNumber("number", number);
        _json.WriteEndObject();
    }

    private void WriteTable(ReportTable table)
    {
        _json.WriteStartObject();
        _json.WriteString("code", table.Code);
        _json.WriteString("component", table.Component);
        _json.WriteString("title", table.Title);
        WriteArray("columns", table.Columns, column =>
        {
            _json.WriteStartObject();
            _json.WriteString("name", column.Name);
            _json.WriteString("kind", column.Kind.ToString().ToLowerInvariant());
            if (column.Kind == ColumnKind.Label)
                WriteArray("values", column.Labels, _json.WriteStringValue);
            else
                WriteArray("values", column.Numbers, WriteNumberValue);
            _json.WriteEndObject();
        });
        _json.WriteEndObject();
    }

    private void WriteFigure(string name, Estimate figure)
    {
        _json.WriteStartObject(name);
        WriteNumber("value", figure.Value);
        if (figure.StandardError is { } error)
        {
            WriteNumber("se", error);
            WriteNumber("low", figure.Low ?? double.NaN);
            WriteNumber("high", figure.High ?? double.NaN);
        }
        else
        {
            _json.WriteNull("se");
            _json.WriteString("reason", figure.Reason);
        }

        _json.WriteEndObject();
    }

    private void WriteArray<T>(string name, IEnumerable<T> items, Action<T> write)
    {
        _json.WriteStartArray(name);
        foreach (var item in items) write(item);
        _json.WriteEndArray();
    }

    private void WriteNumber(string name, double value)
    {
        _json.WritePropertyName(name);
        WriteNumberValue(value);
    }

    /// <summary>JSON knows no infinity and no not-a-number: null stands for both.</summary>
    private void WriteNumberValue(double value)
    {
        if (double.IsFinite(value))
            _json.WriteNumberValue(value);
        else
            _json.WriteNullValue();
    }
}
