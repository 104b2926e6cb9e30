using Swarm.Engine.Models;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Models;

public class SketchTests
{
    private const string PensionFund =
        """
        model: Larkfell pension fund, thirty years
        money: {unit: crown, scale: 1_000}
        horizon: 30
        draws:
          equity[t]: lognormal(mean=1.07, sd=0.16)          # a growth factor
          inflation[t]:
            draw: normal(mean=2.5%, sd=1.2%)
            stream: prices
          shock: one_of(values=[-40%, 0%], chances=[0.02, 0.98])
        formulas:
          price[0]: 1
          price[t]: price[t-1] * (1 + inflation[t])
          fund[0]: 1_000_000 * (1 + shock)
          fund[t]: max(0, fund[t-1] * equity[t] - 40_000 * price[t])
          ruined: fund[horizon] <= 0
        outcomes:
          fund[t]:
            adverse: low
            fan: true
            levels: [50%, 99.5%]
          ruined: {}
        """;

    [Fact]
    public void The_pension_fund_is_read_whole()
    {
        Model model = Documents.Accepted(PensionFund);

        Assert.Equal("Larkfell pension fund, thirty years", model.Title);
        Assert.Equal(new Money("crown", 1000), model.Money);
        Assert.Equal(30, model.Horizon);
        Assert.Equal(["equity[t]", "inflation[t]", "shock"], model.Draws.Select(d => d.Name.ToString()));
        Assert.Equal(["equity", "prices", "shock"], model.Draws.Select(d => d.Stream));
        Assert.Equal(["price[0]", "price[t]", "fund[0]", "fund[t]", "ruined"], model.Formulas.Select(f => f.Name.ToString()));
        Assert.Equal(0.025, model.Draws[1].Distribution.Mean);
        Assert.Empty(Documents.Read(PensionFund).Diagnostics);
    }

    [Fact]
    public void Outcomes_keep_what_was_asked_of_them()
    {
        Model model = Documents.Accepted(PensionFund);

        Outcome fund = model.Outcomes[0];
        Assert.Equal(QuantityKind.PerStep, fund.Kind);
        Assert.Equal(Adverse.Low, fund.Adverse);
        Assert.True(fund.Fan);
        Assert.True(fund.IsMoney);
        Assert.Equal([0.5, 0.995], fund.Levels);
        Assert.False(model.Outcomes[1].IsMoney);
        Assert.Equal(Outcome.DefaultLevels, model.Outcomes[1].Levels);
    }

    [Fact]
    public void A_formula_stands_where_its_key_stands()
    {
        Formula ruined = Documents.Accepted(PensionFund).Formulas[^1];

        Assert.Equal(new SourcePosition("model.yaml", 15, 3), ruined.Position);
        ReferenceExpression fund = Assert.IsType<ReferenceExpression>(Assert.IsType<BinaryExpression>(ruined.Body).Left);
        Assert.Equal(StepIndex.Horizon, fund.Index);
        Assert.Equal(new SourcePosition("model.yaml", 15, 11), fund.Position);
    }
}
