using Swarm.Engine.Plans;

namespace Swarm.Engine.Tests.Plans;

public sealed class FaultTests
{
    private const string LogOfDraw = """
        model: test
        draws:
          x: normal(mean=3.9, sd=1)
        formulas:
          y: log(x)
        outcomes:
          y: {}
        """;

    [Fact]
    public void A_fault_names_the_lowest_trial_the_quantity_and_the_values()
    {
        double[] x = TestModel.Values(LogOfDraw.Replace("y: {}", "x: {}", StringComparison.Ordinal), 65536)["x"];
        int expected = Array.FindIndex(x, value => value < 0);

        Fault fault = TestModel.Run(LogOfDraw, 200_000).Fault!;

        Assert.Equal(expected, fault.Trial);
        Assert.Equal("y", fault.Quantity);
        Assert.Null(fault.Step);
        Assert.True(double.IsNaN(fault.Value));
        Assert.Equal(KeyValuePair.Create("x", x[expected]), Assert.Single(fault.Inputs));
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(7)]
    public void The_fault_is_the_same_for_any_number_of_threads(int threads)
    {
        Fault expected = TestModel.Run(LogOfDraw, 200_000, 1).Fault!;

        Assert.Equal(expected.ToString(), TestModel.Run(LogOfDraw, 200_000, threads).Fault!.ToString());
    }

    [Fact]
    public void A_fault_beyond_the_last_trial_does_not_count()
    {
        double[] x = TestModel.Values(LogOfDraw.Replace("y: {}", "x: {}", StringComparison.Ordinal), 65536)["x"];
        int first = Array.FindIndex(x, value => value < 0);

        Assert.Null(TestModel.Run(LogOfDraw, first).Fault);
        Assert.NotNull(TestModel.Run(LogOfDraw, first + 1).Fault);
    }

    [Fact]
    public void A_fault_names_its_step()
    {
        Fault fault = TestModel.Run("""
            model: test
            horizon: 5
            formulas:
              left[0]: 3
              left[t]: left[t-1] - 1
              share[t]: 1 / left[t]
              total: sum(share[t])
            outcomes:
              total: {}
            """).Fault!;

        Assert.Equal(("share", 3, 0L), (fault.Quantity, fault.Step, fault.Trial));
        Assert.Contains(KeyValuePair.Create("left[3]", 0.0), fault.Inputs);
    }

    [Theory]
    [InlineData("if(x > 0, log(x), 0)")]
    [InlineData("if(x <= 0, 0, log(x))")]
    [InlineData("if(x > 0, if(log(x) > 0, log(x), 1), 0)")]
    [InlineData("if(x > 0 and log(x) > 0, 1, 0)")]
    [InlineData("if(x <= 0 or log(x) < 0, 1, 0)")]
    [InlineData("if(x > 0, 1 / (log(x) - log(x) + 1), 0)")]
    public void Only_the_chosen_arm_of_an_if_can_fault(string formula)
    {
        RunOutcome outcome = TestModel.Run(LogOfDraw.Replace("log(x)", formula, StringComparison.Ordinal), 100_000);

        Assert.Null(outcome.Fault);
    }

    [Theory]
    [InlineData("if(log(x) > 0, 1, 2)")]
    [InlineData("max(0, log(x))")]
    [InlineData("min(log(x), 0)")]
    [InlineData("clamp(log(x), 0, 1)")]
    [InlineData("1 / exp(1_000 * x)")]
    [InlineData("exp(-exp(1_000 * x))")]
    [InlineData("log(x) > 0")]
    [InlineData("not log(x)")]
    [InlineData("0 * log(x)")]
    [InlineData("log(x) ^ 0")]
    [InlineData("x / (x - x)")]
    [InlineData("sqrt(x)")]
    public void No_operation_swallows_a_fault(string formula)
    {
        RunOutcome outcome = TestModel.Run(LogOfDraw.Replace("log(x)", formula, StringComparison.Ordinal), 100_000);

        Assert.NotNull(outcome.Fault);
    }
}
