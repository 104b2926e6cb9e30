using Swarm.Cli.Commands;

namespace Swarm.Cli.Tests.Commands;

/// <summary>Runs command lines in this process, with a folder of their own for files.</summary>
public sealed class CommandFixture : IDisposable
{
    private readonly StringWriter _out = new();
    private readonly StringWriter _error = new();

    public string Folder { get; } = Directory.CreateTempSubdirectory("swarm-").FullName;

    public string Out => _out.ToString();

    public string Error => _error.ToString();

    public void Dispose() => Directory.Delete(Folder, recursive: true);

    public string PathOf(string name) => Path.Combine(Folder, name);

    /// <summary>Writes a file into the folder and gives its path.</summary>
    public string Write(string name, string text)
    {
        File.WriteAllText(PathOf(name), text);
        return PathOf(name);
    }

    internal Task<int> RunAsync(params string[] arguments) => InvokeAsync(new Terminal { Out = _out, Error = _error }, arguments, CancellationToken.None);

    internal Task<int> RunAsync(ModelRun run, CancellationToken cancellation, params string[] arguments) =>
        InvokeAsync(new Terminal { Out = _out, Error = _error, Run = run }, arguments, cancellation);

    private Task<int> InvokeAsync(Terminal terminal, string[] arguments, CancellationToken cancellation)
    {
        _out.GetStringBuilder().Clear();
        _error.GetStringBuilder().Clear();
        return SwarmCommand.InvokeAsync(arguments, terminal, cancellation);
    }
}
