using System.Runtime.InteropServices;
using System.Text;
using Swarm.Cli;
using Swarm.Cli.Commands;

Console.OutputEncoding = Encoding.UTF8;
using var interrupt = new CancellationTokenSource();

// The first signal stops cleanly; a second one finds the signal's own handler again and ends the process at once.
void Stop(PosixSignalContext signal)
{
    if (interrupt.IsCancellationRequested) return;
    signal.Cancel = true;
    interrupt.Cancel();
}

using var onInterrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, Stop);
using var onTerminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Stop);
var terminal = new Terminal { Out = Console.Out, Error = Console.Error, IsInteractive = !Console.IsErrorRedirected };
return await SwarmCommand.InvokeAsync(args, terminal, interrupt.Token);
