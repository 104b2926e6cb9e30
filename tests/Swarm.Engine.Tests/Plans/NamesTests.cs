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

    [Theory]
    [InlineData("odp_bootstrap")]
    [InlineData("mack")]
    public void A_triangle_keeps_its_numbers_beside_other_triangles_and_draws(string method)
    {
        string alone = $$"""
            model: test
            triangles:
              motor: {data: motor.csv, amounts: cumulative, method: {{method}}}
            outcomes:
              motor.unpaid: {}
            """;
        string together = alone
            .Replace("triangles:", "draws:\n  a: normal(mean=0, sd=1)\ntriangles:\n  fleet: {data: fleet.csv, amounts: cumulative, method: mack}", StringComparison.Ordinal)
            .Replace("outcomes:", "outcomes:\n  a: {}\n  fleet.unpaid: {}", StringComparison.Ordinal);
        Dictionary<string, double[]> before = TestModel.Values(alone);
        Dictionary<string, double[]> after = TestModel.Values(together);

        Assert.All(before, outcome => Assert.Equal(outcome.Value, after[outcome.Key]));
        Assert.NotEqual(after["motor.unpaid"], after["fleet.unpaid"]);
    }

    [Fact]
    public void A_renamed_triangle_draws_other_numbers()
    {
        const string text = """
            model: test
            triangles:
              motor: {data: motor.csv, amounts: cumulative, method: odp_bootstrap}
            outcomes:
              motor.unpaid: {}
            """;
        double[] renamed = TestModel.Values(text.Replace("  motor", "  cars", StringComparison.Ordinal))["cars.unpaid"];

        Assert.NotEqual(TestModel.Values(text)["motor.unpaid"], renamed);
    }
}
