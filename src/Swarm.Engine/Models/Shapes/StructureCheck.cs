using System.Globalization;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Models.Names;

namespace Swarm.Engine.Models.Shapes;

/// <summary>
/// Compares a document with its shape and tells every difference. What has no error here can be read by the sections without
/// asking again; what has one is passed over by them in silence.
/// </summary>
/// <param name="diagnostics">Where differences are told.</param>
internal sealed class StructureCheck(DiagnosticList diagnostics)
{
    public void Check(DocumentNode node, Shape shape, string place)
    {
        switch (shape)
        {
            case ShortOrLongShape either:
                Check(node, node is MappingNode ? either.Long : either.Short, place);
                break;
            case ObjectShape { MayBeNothing: true } when node is ScalarNode { IsNothing: true }:
                break;
            case ObjectShape fields when Is<MappingNode>(node, place) is { } mapping:
                CheckFields(mapping, fields, place);
                break;
            case MapShape map when Is<MappingNode>(node, place) is { } mapping:
                CheckEntries(mapping, map, place);
                break;
            case ListShape list when Is<SequenceNode>(node, place) is { } sequence:
                CheckItems(sequence, list, place);
                break;
            case not (ObjectShape or MapShape or ListShape) when Is<ScalarNode>(node, place) is { } scalar:
                CheckScalar(scalar, shape, place);
                break;
        }
    }

    private T? Is<T>(DocumentNode node, string place)
        where T : DocumentNode
    {
        if (node is T right)
        {
            return right;
        }

        diagnostics.Error(node.Position, $"{place} is {node.Kind}", typeof(T) == typeof(MappingNode) ? EntriesHint(node)
            : typeof(T) == typeof(SequenceNode) ? "write a list, as in [a, b]"
            : "write a single value");
        return null;
    }

    private static string EntriesHint(DocumentNode node) =>
        node is ScalarNode { IsPlain: true } scalar && scalar.Text.Contains(':', StringComparison.Ordinal)
            ? "leave a space behind the colon"
            : "write entries 'key: value', one a line";

    private void CheckFields(MappingNode mapping, ObjectShape shape, string place)
    {
        foreach (MappingEntry entry in mapping.Entries)
        {
            string key = entry.Key.Text;
            Field? field = shape.Fields.FirstOrDefault(f => f.Key == key);
            if (field is null)
            {
                ReportUnknown(entry.Key, shape, place);
            }
            else
            {
                Check(entry.Value, field.Shape, DiagnosticList.Quote(key));
            }
        }

        foreach (Field missing in shape.Fields.Where(f => f.IsRequired && mapping[f.Key] is null))
        {
            diagnostics.Error(
                mapping.Position,
                $"'{missing.Key}' is missing in {place}",
                $"add '{missing.Key}: ...' ({FirstSentence(missing.Shape.Help)})");
        }

        int given = shape.OneOf.Count(key => mapping[key] is not null);
        if (shape.OneOf.Count > 0 && given != 1)
        {
            diagnostics.Error(
                mapping.Position,
                $"{place} has {(given == 0 ? "none" : "more than one")} of {string.Join(" and ", shape.OneOf.Select(k => $"'{k}'"))}",
                "write one of them");
        }
    }

    private static string FirstSentence(string help) => help.Split([". ", ": ", "; "], 2, StringSplitOptions.None)[0].TrimEnd('.');

    private void ReportUnknown(ScalarNode key, ObjectShape shape, string place)
    {
        string? nearest = NearestName.Of(key.Text, shape.Fields.Select(f => f.Key));
        diagnostics.Error(
            key.Position,
            $"{DiagnosticList.Quote(key.Text)} is not known in {place}",
            nearest is null ? $"known are {string.Join(", ", shape.Fields.Select(f => f.Key))}" : $"did you mean '{nearest}'?");
    }

    private void CheckEntries(MappingNode mapping, MapShape shape, string place)
    {
        if (mapping.Entries.Count < shape.Least)
        {
            diagnostics.Error(mapping.Position, $"{place} is empty", "name at least one, as in 'x: {}'");
        }

        foreach (MappingEntry entry in mapping.Entries)
        {
            string key = entry.Key.Text;
            if (shape.Names.Read(key) is null)
            {
                ReportName(entry.Key, shape.Names);
            }
            else if (key.Length > ModelBounds.NameLength)
            {
                diagnostics.Error(entry.Key.Position, $"the name is longer than {ModelBounds.NameLength} characters");
            }

            Check(entry.Value, shape.Value, DiagnosticList.Quote(key));
        }
    }

    private void ReportName(ScalarNode key, NameForm form)
    {
        int length = NameText.LengthAt(key.Text, 0);
        string name = key.Text[..length];
        if (length > 0 && NameForm.IsReserved(name))
        {
            diagnostics.Error(
                key.Position,
                $"{DiagnosticList.Quote(name)} is a word of formulas and cannot be a name",
                "choose another name");
        }
        else if (length > 0 && (length == key.Text.Length || key.Text[length] == '['))
        {
            diagnostics.Error(
                key.PositionOf(length),
                $"{DiagnosticList.Quote(key.Text)} has an index that cannot stand here",
                form.Allowed);
        }
        else
        {
            diagnostics.Error(
                key.PositionOf(length),
                $"{DiagnosticList.Quote(key.Text)} is no name",
                "a name is made of letters, digits, '_' and '.', and begins with a letter");
        }
    }

    private void CheckItems(SequenceNode sequence, ListShape shape, string place)
    {
        if (sequence.Items.Count < shape.Least || sequence.Items.Count > shape.Most)
        {
            string wanted = sequence.Items.Count < shape.Least ? $"at least {shape.Least}" : $"at most {shape.Most}";
            diagnostics.Error(sequence.Position, $"{place} has {sequence.Items.Count} items", $"write {wanted}");
        }

        foreach (DocumentNode item in sequence.Items.Take(shape.Most))
        {
            Check(item, shape.Item, $"an item of {place}");
        }
    }

    private void CheckScalar(ScalarNode scalar, Shape shape, string place)
    {
        if (scalar.IsNothing)
        {
            diagnostics.Error(
                scalar.Position,
                scalar.Text.Length == 0 ? $"{place} has no value" : $"{place} is {scalar.Text}, which YAML takes for nothing",
                scalar.Text.Length == 0 ? "write one behind the colon" : "write a value, or put the word in quotes");
            return;
        }

        switch (shape)
        {
            case NumberShape number:
                NumberCheck.Check(scalar, number, place, diagnostics);
                break;
            case ChoiceShape choice when choice.Choices.All(c => c.Word != scalar.Text):
                ReportChoice(scalar, choice, place);
                break;
            case DateShape when !DateOnly.TryParseExact(scalar.Text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out _):
                diagnostics.Error(
                    scalar.Position,
                    $"{place} is {DiagnosticList.Quote(scalar.Text)}, which is no day",
                    "write it as 2025-12-31");
                break;
            case TextShape when scalar.Text.Length > ModelBounds.FreeTextLength:
                diagnostics.Error(scalar.Position, $"{place} is longer than {ModelBounds.FreeTextLength} characters");
                break;
        }
    }

    private void ReportChoice(ScalarNode scalar, ChoiceShape choice, string place)
    {
        string[] words = [.. choice.Choices.Select(c => c.Word)];
        string? nearest = choice.IsTruth ? TruthOf(scalar.Text) : NearestName.Of(scalar.Text, words);
        diagnostics.Error(
            scalar.Position,
            $"{place} is {DiagnosticList.Quote(scalar.Text)}, which is none of {string.Join(", ", words)}",
            nearest is null ? null : $"write {nearest}");
    }

    private static string? TruthOf(string text) => text.ToLowerInvariant() switch
    {
        "yes" or "on" or "y" or "true" or "1" => "true",
        "no" or "off" or "n" or "false" or "0" => "false",
        _ => null,
    };
}
