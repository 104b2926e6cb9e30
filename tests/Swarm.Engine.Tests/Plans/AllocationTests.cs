using Swarm.Engine.Plans;

namespace Swarm.Engine.Tests.Plans;

public sealed class AllocationTests
{
    [Fact]
    public void Computing_leaves_allocates_nothing_once_warm()
    {
        const string Model = """
            model: test
            horizon: 3
            draws:
              rate[t]: normal(mean=3%, sd=5%)
              size: gamma(shape=2, scale=3)
            formulas:
              total: sum(rate[t]) * size
            outcomes:
              total: {}
            """;
        var run = new PreparedRun(TestModel.Read(Model), new RunSettings { Trials = 1_000_000, Threads = 1 });
        using var runner = new LeafRunner(run);
        runner.Compute(0);

        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int leaf = 1; leaf < 10; leaf++)
        {
            runner.Compute(leaf);
        }

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }
}
