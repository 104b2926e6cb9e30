namespace Swarm.Engine.Plans;

/// <summary>
/// The order of evaluation: only what an outcome needs, every operand before its user, step by step so that few columns are
/// alive at once. Ties go by name, so that the order of entries in the document means nothing.
/// </summary>
internal static class Schedule
{
    public static IReadOnlyList<Instance> Of(QuantityGraph graph, IEnumerable<Instance> outcomes)
    {
        HashSet<Instance> needed = Reachable(graph, outcomes);
        IEnumerable<Instance> byStep = needed
            .OrderBy(instance => instance.Step == Instance.PerTrial ? int.MaxValue : instance.Step)
            .ThenBy(instance => instance.Name, StringComparer.Ordinal);
        var order = new List<Instance>(needed.Count);
        var done = new HashSet<Instance>();
        foreach (Instance instance in byStep)
        {
            Visit(graph, instance, done, order);
        }

        return order;
    }

    private static HashSet<Instance> Reachable(QuantityGraph graph, IEnumerable<Instance> outcomes)
    {
        var reached = new HashSet<Instance>(outcomes);
        var pending = new Queue<Instance>(reached);
        while (pending.TryDequeue(out Instance instance))
        {
            foreach (Instance dependency in graph.Dependencies(instance).Where(reached.Add))
            {
                pending.Enqueue(dependency);
            }
        }

        return reached;
    }

    /// <summary>Depth first with a stack of our own: a chain over thousands of steps must not overflow the thread's.</summary>
    private static void Visit(QuantityGraph graph, Instance root, HashSet<Instance> done, List<Instance> order)
    {
        var stack = new Stack<(Instance Instance, bool IsReady)>([(root, false)]);
        while (stack.TryPop(out (Instance Instance, bool IsReady) top))
        {
            if (done.Contains(top.Instance))
            {
                continue;
            }

            if (top.IsReady)
            {
                done.Add(top.Instance);
                order.Add(top.Instance);
                continue;
            }

            stack.Push((top.Instance, true));
            foreach (Instance dependency in graph.Dependencies(top.Instance).Where(d => !done.Contains(d)))
            {
                stack.Push((dependency, false));
            }
        }
    }
}
