using Spectre.Console;
using Swarm.Engine.Models;
using Swarm.Engine.Plans;

namespace Swarm.Cli.Running;

/// <summary>A run with its progress on the terminal. Nothing is drawn where no one can see it being redrawn.</summary>
internal sealed class WatchedRun(Terminal terminal)
{
    private static readonly TimeSpan RedrawEvery = TimeSpan.FromMilliseconds(200);
    private RunProgress? _latest;

    /// <exception cref="OperationCanceledException">The run was cancelled.</exception>
    public async Task<RunOutcome> ExecuteAsync(Model model, RunSettings settings, CancellationToken cancellation)
    {
        var start = terminal.Clock.GetTimestamp();
        using var finished = new CancellationTokenSource();
        var drawing = terminal.IsInteractive ? DrawUntilAsync(model, start, finished.Token) : Task.CompletedTask;
        try
        {
            var outcome = await Task.Run(() => Run(model, settings, finished, cancellation), CancellationToken.None);
            if (outcome is { Fault: null, Refusal: null })
                terminal.Tell(ProgressText.Closing(settings.Trials, terminal.Clock.GetElapsedTime(start)));
            return outcome;
        }
        finally
        {
            await drawing;
        }
    }

    private RunOutcome Run(Model model, RunSettings settings, CancellationTokenSource finished, CancellationToken cancellation)
    {
        try
        {
            return terminal.Run(model, settings, progress => Volatile.Write(ref _latest, progress), cancellation);
        }
        finally
        {
            finished.Cancel();
        }
    }

    private async Task DrawUntilAsync(Model model, long start, CancellationToken finished)
    {
        var console = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(terminal.Error) });
        var featured = new FeaturedOutcome(model);
        using var timer = new PeriodicTimer(RedrawEvery, terminal.Clock);
        await console.Live(new Text("")).AutoClear(true).StartAsync(async live =>
        {
            while (await TickAsync(timer, finished))
            {
                if (Volatile.Read(ref _latest) is { } progress)
                    live.UpdateTarget(Picture(progress, featured, terminal.Clock.GetElapsedTime(start)));
            }
        });
    }

    private static async Task<bool> TickAsync(PeriodicTimer timer, CancellationToken finished)
    {
        try
        {
            return await timer.WaitForNextTickAsync(finished);
        }
        catch (OperationCanceledException)
        {
            return false;
        }
    }

    private static Rows Picture(RunProgress progress, FeaturedOutcome featured, TimeSpan elapsed)
    {
        var bar = new Text(ProgressText.Bar(progress, elapsed));
        return featured.Figures(progress) is { } figures ? new Rows(bar, new Text(ProgressText.Figures(figures))) : new Rows(bar);
    }
}
