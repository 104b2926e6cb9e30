using Google.Protobuf;
using Swarm.Engine.Records;
using Swarm.Protocol.Mapping;

namespace Swarm.Protocol.Records;

/// <summary>Writes run records.</summary>
public static class RecordWriter
{
    /// <summary>The bytes of a record's file. Equal records give equal bytes.</summary>
    public static byte[] ToBytes(RunRecord record) => RecordHeader.Wrap(RecordMapping.ToMessage(record).ToByteArray());

    /// <summary>
    /// Writes a record's file whole or not at all: to a temporary file beside it, to the disk, then renamed over whatever had the
    /// name. The folder is made if need be.
    /// </summary>
    /// <exception cref="IOException">The disk refuses; no file is left behind.</exception>
    /// <exception cref="UnauthorizedAccessException">The folder may not be written; no file is left behind.</exception>
    public static void Save(RunRecord record, string path) => AtomicFile.Write(path, ToBytes(record));
}
