using Swarm.Engine.Models.Documents;

namespace Swarm.Engine.Models.Sections;

/// <summary>The data files that a model names, each asked for once.</summary>
/// <param name="find">Finds a file by name.</param>
internal sealed class DataFiles(Func<string, DataFile?> find)
{
    private readonly Dictionary<string, DataFile?> _known = new(StringComparer.Ordinal);
    private readonly List<DataFile> _found = [];

    /// <summary>Files that were found, in the order in which they were first named.</summary>
    public IReadOnlyList<DataFile> Found => _found;

    /// <summary>The file that a node names, or null and a diagnostic.</summary>
    public DataFile? Find(ScalarNode name, DiagnosticList diagnostics)
    {
        if (!_known.TryGetValue(name.Text, out DataFile? file))
        {
            file = find(name.Text);
            _known.Add(name.Text, file);
            if (file is not null)
            {
                _found.Add(file);
            }
        }

        if (file is null)
        {
            diagnostics.Error(
                name.Position,
                $"there is no data file {DiagnosticList.Quote(name.Text)}",
                "its name is taken as seen from the model");
        }
        else if (file.Content.Length > ModelBounds.DataFileBytes)
        {
            diagnostics.Error(
                name.Position,
                $"data file {DiagnosticList.Quote(name.Text)} has more than {ModelBounds.DataFileBytes >> 20} MiB");
            return null;
        }

        return file;
    }
}
