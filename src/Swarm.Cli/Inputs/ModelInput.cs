using System.Text;
using Swarm.Engine.Models;
using Swarm.Engine.Records;

namespace Swarm.Cli.Inputs;

/// <summary>A model read from the disk together with the data that it names.</summary>
/// <param name="Source">The document, as it goes into the run record.</param>
/// <param name="Reading">The model, or why it is refused.</param>
internal sealed record ModelInput(RecordedModel Source, ModelReading Reading)
{
    private const long MostDataBytes = 1 << 26;

    /// <summary>Reads a model; data files are looked for in the model's folder.</summary>
    /// <exception cref="IOException">The document cannot be read.</exception>
    /// <exception cref="UnauthorizedAccessException">The document may not be read.</exception>
    public static ModelInput Read(string path)
    {
        var text = File.ReadAllText(path, Encoding.UTF8);
        var folder = Path.GetDirectoryName(Path.GetFullPath(path)) ?? ".";
        var reading = ModelReader.Read(path, text, name => Data(folder, name));
        return new ModelInput(new RecordedModel(Path.GetFileName(path), text), reading);
    }

    /// <summary>The data files as they go into the run record.</summary>
    public IReadOnlyList<RecordedData> Data() => [.. Reading.Data.Select(file => new RecordedData(file.Name, file.Content))];

    /// <summary>Null for a file that is not there or cannot be read: the reader says so at the place that names it.</summary>
    private static DataFile? Data(string folder, string name)
    {
        try
        {
            var file = new FileInfo(Path.Combine(folder, name));
            return file.Exists && file.Length <= MostDataBytes ? new DataFile(name, File.ReadAllBytes(file.FullName)) : null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            return null;
        }
    }
}
