namespace Swarm.Cli;

/// <summary>What the command's exit says to a script. Documented in docs/command.md; never renumbered.</summary>
internal static class ExitCodes
{
    public const int Done = 0;

    /// <summary>The model or its data are refused.</summary>
    public const int InputRefused = 1;

    /// <summary>The command line is not understood.</summary>
    public const int Usage = 2;

    /// <summary>The run stopped at a fault of arithmetic, or its result is refused.</summary>
    public const int Fault = 3;

    /// <summary>The run record is refused.</summary>
    public const int RecordRefused = 4;

    /// <summary>A result could not be written.</summary>
    public const int NotWritten = 5;

    /// <summary>Stopped by the user: 128 and the number of SIGINT, as shells have it.</summary>
    public const int Interrupted = 130;
}
