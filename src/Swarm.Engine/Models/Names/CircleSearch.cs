namespace Swarm.Engine.Models.Names;

/// <summary>
/// Finds quantities that need themselves, by depth-first search over the single steps: <c>price[t]</c> may well need
/// <c>fund[t-1]</c> while <c>fund[t]</c> needs <c>price[t]</c>. The stack is kept by hand, as chains are as long as the horizon.
/// </summary>
/// <param name="graph">What depends on what.</param>
/// <param name="diagnostics">Where circles are told.</param>
internal sealed class CircleSearch(DependencyGraph graph, DiagnosticList diagnostics)
{
    private const int MaxReported = 10;
    private const int MaxShown = 8;

    private readonly byte[] _states = new byte[graph.Instances];
    private readonly List<Frame> _path = [];
    private readonly HashSet<string> _reported = new(StringComparer.Ordinal);

    public void Run()
    {
        for (int unit = 0; unit < graph.Units.Count; unit++)
        {
            int last = graph.Units[unit].IsStepped ? graph.Horizon : 0;
            for (int step = 0; step <= last && _reported.Count < MaxReported; step++)
            {
                Visit(unit, step);
            }
        }
    }

    private void Visit(int unit, int step)
    {
        if (StateOf(unit, step) != State.New)
        {
            return;
        }

        Enter(unit, step);
        while (_path.Count > 0)
        {
            Frame top = _path[^1];
            (int Unit, int Step)? next = graph.Units[top.Unit].Dependency(top.Step, top.Next, graph.Horizon);
            _path[^1] = top with { Next = top.Next + 1 };
            if (next is not (int, int) needed)
            {
                StateOf(top.Unit, top.Step) = State.Done;
                _path.RemoveAt(_path.Count - 1);
            }
            else if (StateOf(needed.Unit, needed.Step) == State.New)
            {
                Enter(needed.Unit, needed.Step);
            }
            else if (StateOf(needed.Unit, needed.Step) == State.Open)
            {
                Report(needed.Unit, needed.Step);
            }
        }
    }

    private ref byte StateOf(int unit, int step) =>
        ref _states[graph.Units[unit].Base + (graph.Units[unit].IsStepped ? step : 0)];

    private void Enter(int unit, int step)
    {
        StateOf(unit, step) = State.Open;
        _path.Add(new Frame(unit, step, 0));
    }

    private void Report(int unit, int step)
    {
        int first = _path.FindLastIndex(frame => frame.Unit == unit && frame.Step == step);
        Frame[] circle = [.. _path.Skip(first).Where(frame => graph.Units[frame.Unit].Name is not null)];
        string key = string.Join(' ', circle.Select(frame => frame.Unit).Distinct().Order());
        if (_reported.Count >= MaxReported || !_reported.Add(key))
        {
            return;
        }

        IEnumerable<string> shown = circle.Length <= MaxShown
            ? circle.Select(Show)
            : [.. circle.Take(MaxShown - 1).Select(Show), $"... ({circle.Length - MaxShown + 1} more)"];
        string places = string.Join(", ", circle
            .Select(frame => graph.Units[frame.Unit])
            .Distinct()
            .Take(MaxShown)
            .Select(u => $"{u.Name} in line {u.Position.Line}"));
        diagnostics.Error(
            graph.Units[circle[0].Unit].Position,
            $"a circle: {string.Join(" -> ", shown)} -> {Show(circle[0])}",
            $"break it, for example by looking back with [t-1] ({places})");
    }

    private string Show(Frame frame)
    {
        DependencyUnit unit = graph.Units[frame.Unit];
        return unit.IsStepped ? $"{unit.Name}[{frame.Step}]" : unit.Name!;
    }

    /// <summary>An instance on the way, and the number of its dependency to follow next.</summary>
    private readonly record struct Frame(int Unit, int Step, int Next);

    private static class State
    {
        public const byte New = 0;
        public const byte Open = 1;
        public const byte Done = 2;
    }
}
