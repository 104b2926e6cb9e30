namespace Swarm.Cli.Commands;

/// <summary>Turns a disk that refuses into a message and an exit code.</summary>
internal static class FileFaults
{
    public static int Guard(Terminal terminal, string path, Action write)
    {
        try
        {
            write();
            return ExitCodes.Done;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            terminal.Tell($"cannot write {path}: {fault.Message}");
            return ExitCodes.NotWritten;
        }
    }
}
