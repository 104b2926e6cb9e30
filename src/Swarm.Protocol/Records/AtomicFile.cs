namespace Swarm.Protocol.Records;

/// <summary>Files that are there whole or not at all.</summary>
public static class AtomicFile
{
    /// <summary>Writes to a temporary file in the same folder, flushes it to the disk and renames it over <paramref name="path"/>.</summary>
    public static void Write(string path, ReadOnlySpan<byte> content)
    {
        var target = Path.GetFullPath(path);
        var folder = Path.GetDirectoryName(target) ?? throw new IOException($"{path} is no file name");
        Directory.CreateDirectory(folder);
        var temporary = Path.Combine(folder, $".{Path.GetFileName(target)}.{Path.GetRandomFileName()}");
        try
        {
            using (var stream = new FileStream(temporary, FileMode.CreateNew, FileAccess.Write, FileShare.None))
            {
                stream.Write(content);
                stream.Flush(flushToDisk: true);
            }

            File.Move(temporary, target, overwrite: true);
        }
        catch
        {
            File.Delete(temporary);
            throw;
        }
    }
}
