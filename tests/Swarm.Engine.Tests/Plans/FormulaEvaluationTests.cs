namespace Swarm.Engine.Tests.Plans;

public sealed class FormulaEvaluationTests
{
    [Theory]
    [InlineData("2 + 3 * 4", 14)]
    [InlineData("(2 + 3) * 4", 20)]
    [InlineData("-2 ^ 2", -4)]
    [InlineData("2 ^ 3 ^ 2", 512)]
    [InlineData("7.5% * 1_000", 75)]
    [InlineData("10 / 4 - 1", 1.5)]
    [InlineData("min(3, 1, 2)", 1)]
    [InlineData("max(3, 1, 2)", 3)]
    [InlineData("clamp(5, 0, 3)", 3)]
    [InlineData("clamp(-5, 0, 3)", 0)]
    [InlineData("abs(-4)", 4)]
    [InlineData("floor(-1.5)", -2)]
    [InlineData("sqrt(2.25)", 1.5)]
    [InlineData("exp(0) + log(1)", 1)]
    [InlineData("if(1 < 2, 10, 20)", 10)]
    [InlineData("if(1 > 2, 10, 20)", 20)]
    [InlineData("1 <= 1", 1)]
    [InlineData("1 >= 2", 0)]
    [InlineData("1 == 1 and 2 != 2", 0)]
    [InlineData("1 == 1 or 2 != 2", 1)]
    [InlineData("not 0", 1)]
    public void A_constant_formula_has_its_value(string formula, double expected) =>
        Assert.Equal(expected, One(formula), 1e-15);

    [Fact]
    public void A_formula_of_a_draw_is_computed_trial_by_trial()
    {
        Dictionary<string, double[]> values = TestModel.Values("""
            model: test
            draws:
              x: normal(mean=1, sd=2)
            formulas:
              y: if(x > 1, x ^ 2, -x) + exp(x / 4)
            outcomes:
              x: {}
              y: {}
            """);

        for (int i = 0; i < values["x"].Length; i++)
        {
            double x = values["x"][i];
            double expected = (x > 1 ? x * x : -x) + Math.Exp(x / 4);
            Assert.Equal(expected, values["y"][i], 1e-13 * (1 + Math.Abs(expected)));
        }
    }

    [Fact]
    public void Steps_run_forward_from_the_start_value()
    {
        Dictionary<string, double[]> values = TestModel.Values("""
            model: test
            horizon: 4
            formulas:
              fund[t]: fund[t-1] * 1.5 + 1
              fund[0]: 2
              total: sum(fund[t])
              average: mean(fund[t])
              top: largest(fund[t])
              low: smallest(fund[t])
              ever: any(fund[t] > 13)
              always: all(fund[t] >= 2)
              last: fund[horizon] - fund[1]
            outcomes:
              fund[t]: {}
              total: {}
              average: {}
              top: {}
              low: {}
              ever: {}
              always: {}
              last: {}
            """);

        double[] expected = [2, 4, 7, 11.5, 18.25];
        for (int step = 0; step <= 4; step++)
        {
            Assert.Equal(expected[step], values[$"fund[{step}]"][0]);
        }

        Assert.Equal(expected.Sum(), values["total"][0]);
        Assert.Equal(expected.Average(), values["average"][0]);
        Assert.Equal(18.25, values["top"][0]);
        Assert.Equal(2, values["low"][0]);
        Assert.Equal(1, values["ever"][0]);
        Assert.Equal(1, values["always"][0]);
        Assert.Equal(18.25 - 4, values["last"][0]);
    }

    [Fact]
    public void A_sum_leaves_out_step_0_where_a_quantity_has_none()
    {
        Dictionary<string, double[]> values = TestModel.Values("""
            model: test
            horizon: 3
            formulas:
              price[0]: 10
              price[t]: price[t-1] + 1
              rate[t]: 2
              paid: sum(price[t] * rate[t])
              moved: sum(price[t] - price[t-1])
            outcomes:
              paid: {}
              moved: {}
            """);

        Assert.Equal(2 * (11 + 12 + 13), values["paid"][0]);
        Assert.Equal(3, values["moved"][0]);
    }

    [Fact]
    public void A_chain_over_ten_thousand_steps_is_evaluated()
    {
        Dictionary<string, double[]> values = TestModel.Values("""
            model: test
            horizon: 10_000
            formulas:
              count[0]: 0
              count[t]: count[t-1] + 1
              end: count[horizon]
            outcomes:
              end: {}
            """);

        Assert.Equal(10_000, values["end"][0]);
    }

    private static double One(string formula) => TestModel.Values($$"""
        model: test
        formulas:
          y: {{formula}}
        outcomes:
          y: {}
        """)["y"][0];
}
