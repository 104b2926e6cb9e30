using Google.Protobuf;
using Swarm.Engine.Models;
using Swarm.Engine.Records;
using Swarm.Protocol.Records;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Mapping;

/// <summary>Run records to messages and back. What comes back is consistent in itself, or refused.</summary>
internal static class RecordMapping
{
    public static Proto.RunRecord ToMessage(RunRecord record)
    {
        var message = new Proto.RunRecord
        {
            Format = RecordHeader.Format,
            Edition = (uint)record.Edition,
            ToolVersion = record.ToolVersion,
            Seed = record.Seed,
            Trials = (ulong)record.Trials,
            Title = record.Title,
            Money = record.Money is { } money ? new Proto.Money { Unit = money.Unit, Scale = money.Scale } : null,
            Model = new Proto.RecordedModel { Name = record.Model.Name, Text = record.Model.Text, Sha256 = FromHex(record.Model.Sha256) },
            ResultDigest = FromHex(record.Digest),
        };
        message.Data.AddRange(record.Data.Select(ToMessage));
        message.Outcomes.AddRange(record.Outcomes.Select(OutcomeMapping.ToMessage));
        message.Notes.AddRange(record.Notes.Select(ToMessage));
        message.Tables.AddRange(record.Tables.Select(TableMapping.ToMessage));
        return message;
    }

    /// <exception cref="InvalidDataException">The message contradicts itself; the message of the exception says how.</exception>
    public static RunRecord FromMessage(Proto.RunRecord message)
    {
        Expect.That(message.Format == RecordHeader.Format, "header and contents name different formats");
        Expect.That(message.Edition is > 0 and <= int.MaxValue, "the edition is out of range");
        var trials = Expect.Count(message.Trials, "the number of trials");
        Expect.That(trials > 0, "the record is of no trials");
        var record = new RunRecord
        {
            Edition = (int)message.Edition,
            ToolVersion = message.ToolVersion,
            Seed = message.Seed,
            Trials = trials,
            Title = message.Title,
            Money = message.Money is null ? null : FromMessage(message.Money),
            Model = FromMessage(Expect.Present(message.Model, "the model")),
            Data = [.. message.Data.Select(FromMessage)],
            Outcomes = [.. message.Outcomes.Select(outcome => OutcomeMapping.FromMessage(outcome, trials))],
            Notes = [.. message.Notes.Select(note => new Note(note.Code, note.Text, note.HasNumber ? note.Number : null))],
            Tables = [.. message.Tables.Select(TableMapping.FromMessage)],
        };
        Expect.That(FromHex(record.Digest) == message.ResultDigest, "the figures do not match the result digest");
        return record;
    }

    private static Money FromMessage(Proto.Money message)
    {
        Expect.That(double.IsFinite(message.Scale) && message.Scale > 0, "the scale of money is not above zero");
        return new Money(message.Unit, message.Scale);
    }

    private static RecordedModel FromMessage(Proto.RecordedModel message)
    {
        var model = new RecordedModel(message.Name, message.Text);
        Expect.That(FromHex(model.Sha256) == message.Sha256, "the model does not match its hash");
        return model;
    }

    private static Proto.RecordedData ToMessage(RecordedData data) =>
        new() { Name = data.Name, Content = ByteString.CopyFrom(data.Content.Span), Sha256 = FromHex(data.Sha256) };

    private static RecordedData FromMessage(Proto.RecordedData message)
    {
        var data = new RecordedData(message.Name, message.Content.Memory);
        Expect.That(FromHex(data.Sha256) == message.Sha256, $"the data file {message.Name} does not match its hash");
        return data;
    }

    private static Proto.Note ToMessage(Note note)
    {
        var message = new Proto.Note { Code = note.Code, Text = note.Text };
        if (note.Number is { } number) message.Number = number;
        return message;
    }

    private static ByteString FromHex(string hex) => ByteString.CopyFrom(Convert.FromHexString(hex));
}
