using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>What a method cannot be used on: the cell is named, and a way out.</summary>
public sealed class ReservingRefusalTests
{
    private static readonly ReservingOptions s_bootstrap = new();
    private static readonly ReservingOptions s_mack = new() { Method = ReservingMethod.Mack };

    [Fact]
    public void A_negative_increment_is_allowed_while_its_development_grows_in_total()
    {
        Triangle triangle = Triangles.OfCumulative([100, 160, 150, 152], [110, 170, 190], [95, 150], [120]);
        List<Finding> findings = [];
        ReservingFit? fit = ReservingFit.Of(triangle, s_bootstrap, findings);

        Finding warning = Assert.Single(findings);
        Assert.Equal(Severity.Warning, warning.Severity);
        Assert.Equal("1 negative increment, the first -10 at origin 2001, development 3", warning.Message);
        Assert.All(fit!.Odp!.Residuals, r => Assert.True(r.Fitted > 0));
    }

    [Fact]
    public void A_development_that_shrinks_in_total_has_no_over_dispersed_Poisson_mean()
    {
        Triangle triangle = Triangles.OfCumulative([100, 160, 150, 152], [110, 170, 175], [95, 150], [120]);
        Finding refusal = Triangles.Refusal(triangle, s_bootstrap);

        Assert.StartsWith("the increments at development 3 do not grow the amounts in total (factor 0.98", refusal.Message, StringComparison.Ordinal);
        Assert.Contains("most negative: -10 at origin 2001, development 3", refusal.Message, StringComparison.Ordinal);
        Assert.Contains("method: mack", refusal.Hint, StringComparison.Ordinal);
        Assert.NotNull(ReservingFit.Of(triangle, s_mack, []));
    }

    [Fact]
    public void An_origin_without_a_positive_amount_to_date_is_refused()
    {
        Triangle triangle = Triangles.OfCumulative([100, 160, 180], [110, 170], [-5]);

        Assert.StartsWith(
            "the amount to date of origin 2003, development 1 is -5", Triangles.Refusal(triangle, s_bootstrap).Message, StringComparison.Ordinal);
        Assert.Equal(
            "the amount to date of origin 2003, development 1 is -5, below 0", Triangles.Refusal(triangle, s_mack).Message);
    }

    [Fact]
    public void An_origin_of_zeros_has_a_reserve_of_zero_and_no_residual()
    {
        Triangle triangle = Triangles.OfCumulative([100, 160, 180, 183], [110, 170, 195], [0, 0], [120]);
        OdpFit fit = Triangles.Odp(triangle);

        Assert.Equal(0, fit.ChainLadder.Reserve(2));
        Assert.DoesNotContain(fit.Residuals, r => r.Origin == 2 && r.IsCounted);
        Assert.Equal((8, 6), (fit.Count, fit.Parameters));
        Assert.NotNull(OdpPredictionErrors.Of(fit));
    }

    [Fact]
    public void Mack_divides_by_no_amount_of_zero()
    {
        Triangle triangle = Triangles.OfCumulative([0, 160, 180, 183], [110, 170, 195], [100, 140], [120]);

        Assert.Equal(
            "the cumulative amount of origin 2001, development 1 is 0, and Mack's model divides by it",
            Triangles.Refusal(triangle, s_mack).Message);
        Assert.NotNull(ReservingFit.Of(triangle, s_mack with { Excluded = [(0, 0)] }, []));
        Assert.NotNull(ReservingFit.Of(triangle, s_bootstrap, []));
        Assert.StartsWith(
            "the cumulative amount of origin 2001, development 1 is 0, so its link ratio",
            Triangles.Refusal(triangle, s_bootstrap with { Average = LinkRatioAverage.Simple }).Message,
            StringComparison.Ordinal);
    }

    [Fact]
    public void Too_few_link_ratios_leave_nothing_to_measure_by()
    {
        Triangle two = Triangles.OfCumulative([100, 160], [110]);

        Assert.Equal(
            "3 residuals for 3 parameters leave no degree of freedom to measure the scale", Triangles.Refusal(two, s_bootstrap).Message);
        Assert.StartsWith("one link ratio from development 1 to 2", Triangles.Refusal(two, s_mack).Message, StringComparison.Ordinal);
        Assert.Equal(
            "one development period gives no link ratio", Triangles.Refusal(Triangles.OfCumulative([100], [110]), s_bootstrap).Message);
        Assert.Equal(
            "no link ratio is left from development 1 to 2", Triangles.Refusal(two, s_mack with { Excluded = [(0, 0)] }).Message);
    }

    [Fact]
    public void A_triangle_that_follows_the_chain_ladder_exactly_has_nothing_to_resample()
    {
        Triangle triangle = Triangles.OfCumulative([100, 200, 300], [10, 20], [30]);

        Assert.StartsWith(
            "developments 1 to 3 follow the chain ladder exactly", Triangles.Refusal(triangle, s_bootstrap).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Options_that_cannot_be_are_told_all_at_once()
    {
        List<Finding> findings = [];
        var options = new ReservingOptions
        {
            LastPeriods = 0,
            Excluded = [(3, 0), (0, 9)],
            Tail = new TailOptions { Factor = 0.9, Sd = -1, Periods = 0 },
            Process = ProcessError.Lognormal,
        };

        Assert.Null(ReservingFit.Of(Triangles.Load("small4x4"), options, findings));
        Assert.Equal(7, findings.Count);
        Assert.All(findings, finding => Assert.NotEmpty(finding.Hint));
    }

    [Fact]
    public void Residuals_that_do_not_sum_to_zero_for_want_of_the_excluded_ones_are_warned_of()
    {
        Triangle triangle = Triangles.Load("mw2008");
        ReservingOptions excluding = s_bootstrap with { Excluded = [(4, 2)] };
        List<Finding> findings = [];
        List<Finding> centred = [];

        ReservingFit.Of(triangle, excluding, findings);
        ReservingFit.Of(triangle, excluding with { CentreResiduals = true }, centred);

        Assert.Equal("write centre: true", Assert.Single(findings).Hint);
        Assert.Empty(centred);
    }

    [Fact]
    public void No_tail_is_added_where_part_of_it_is_past_and_unknown()
    {
        Triangle narrow = Triangles.OfCumulative([10, 15], [11, 17], [10, 14], [12]);
        Finding refusal = Triangles.Refusal(narrow, s_bootstrap with { Tail = new TailOptions { Factor = 1.1 } });

        Assert.StartsWith("origin 2001 is 4 periods old but the data end at development 2", refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Factors_without_a_decay_give_no_fitted_tail() =>
        Assert.Equal(
            "the development factors show no exponential decay that settles, so no tail can be fitted",
            Triangles.Refusal(
                Triangles.OfCumulative([100, 110, 132, 172], [100, 111, 135], [100, 110], [100]),
                s_mack with { Tail = new TailOptions() }).Message);
}
