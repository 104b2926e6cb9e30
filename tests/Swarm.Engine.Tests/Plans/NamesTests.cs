namespace Swarm.Engine.Tests.Plans;

/// <summary>The contract of names: an edit moves only what depends on it.</summary>
public sealed class NamesTests
{
    private const string Model = """
        model: test
        horizon: 3
        draws:
          a[t]: normal(mean=0, sd=1)
          b: lognormal(mean=100, sd=30)
        formulas:
          x: sum(a[t])
        outcomes:
          x: {}
          b: {}
        """;

    [Fact]
    public void A_new_draw_moves_no_other()
    {
        Dictionary<string, double[]> before = TestModel.Values(Model);
        Dictionary<string, double[]> after = TestModel.Values(
            Model.Replace("draws:", "draws:\n  c: gamma(shape=2, scale=3)", StringComparison.Ordinal)
                .Replace("outcomes:", "outcomes:\n  c: {}", StringComparison.Ordinal));

        Assert.Equal(before["x"], after["x"]);
        Assert.Equal(before["b"], after["b"]);
    }

    [Fact]
    public void A_renamed_draw_moves_unless_it_keeps_its_stream()
    {
        double[] before = TestModel.Values(Model)["b"];
        double[] renamed = TestModel.Values(Model.Replace("  b:", "  loss:", StringComparison.Ordinal))["loss"];
        double[] kept = TestModel.Values(Model
            .Replace("  b: lognormal(mean=100, sd=30)", "  loss:\n    draw: lognormal(mean=100, sd=30)\n    stream: b", StringComparison.Ordinal)
            .Replace("  b:", "  loss:", StringComparison.Ordinal))["loss"];

        Assert.NotEqual(before, renamed);
        Assert.Equal(before, kept);
    }

    [Fact]
    public void The_order_of_entries_means_nothing()
    {
        Dictionary<string, double[]> before = TestModel.Values(Model);
        Dictionary<string, double[]> after = TestModel.Values("""
            outcomes:
              b: {}
              x: {}
            formulas:
              x: sum(a[t])
            draws:
              b: lognormal(mean=100, sd=30)
              a[t]: normal(mean=0, sd=1)
            horizon: 3
            model: test
            """);

        Assert.Equal(before["x"], after["x"]);
        Assert.Equal(before["b"], after["b"]);
    }

    [Fact]
    public void A_longer_horizon_keeps_the_earlier_steps()
    {
        string stepped = Model.Replace("x: {}", "a[t]: {}", StringComparison.Ordinal);
        Dictionary<string, double[]> before = TestModel.Values(stepped);
        Dictionary<string, double[]> after = TestModel.Values(stepped.Replace("horizon: 3", "horizon: 9", StringComparison.Ordinal));

        Assert.Equal(before["a[2]"], after["a[2]"]);
        Assert.Equal(before["a[3]"], after["a[3]"]);
    }

    [Fact]
    public void Another_seed_moves_every_draw() =>
        Assert.NotEqual(TestModel.Values(Model, seed: 1)["b"], TestModel.Values(Model, seed: 2)["b"]);
}
