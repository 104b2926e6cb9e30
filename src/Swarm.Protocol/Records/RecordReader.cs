using Google.Protobuf;
using Swarm.Protocol.Mapping;
using Proto = Swarm.Protocol.V1;

namespace Swarm.Protocol.Records;

/// <summary>Reads run records, and refuses what is not a whole, undamaged record of a known format.</summary>
public static class RecordReader
{
    /// <summary>Reads a record's file.</summary>
    public static RecordReading Load(string path)
    {
        try
        {
            return Read(File.ReadAllBytes(path));
        }
        catch (Exception fault) when (fault is FileNotFoundException or DirectoryNotFoundException)
        {
            return Refuse(RecordFaultKind.Unreadable, "there is no such file");
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Refuse(RecordFaultKind.Unreadable, $"the file cannot be read ({fault.Message})");
        }
    }

    /// <summary>Reads a record from the bytes of its file.</summary>
    public static RecordReading Read(ReadOnlySpan<byte> file)
    {
        if (RecordHeader.Verify(file) is { } fault) return new RecordReading(null, fault);
        try
        {
            return new RecordReading(RecordMapping.FromMessage(Proto.RunRecord.Parser.ParseFrom(file[RecordHeader.Length..])), null);
        }
        catch (InvalidProtocolBufferException)
        {
            return Refuse(RecordFaultKind.Inconsistent, "the contents are not those of a run record");
        }
        catch (InvalidDataException contradiction)
        {
            return Refuse(RecordFaultKind.Inconsistent, contradiction.Message);
        }
    }

    private static RecordReading Refuse(RecordFaultKind kind, string message) => new(null, new RecordFault(kind, message));
}
