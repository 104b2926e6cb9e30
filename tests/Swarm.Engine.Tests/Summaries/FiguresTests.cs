using Swarm.Engine.Summaries;

namespace Swarm.Engine.Tests.Summaries;

public class FiguresTests
{
    [Fact]
    public void Var_is_the_lower_inverse_and_Tvar_splits_an_atom_at_the_edge()
    {
        // 990 zeros and then 10, ..., 100: at 99.25 % the tail holds 7.5 trials, half of the one at 30 and 40 to 100
        // (Acerbi & Tasche 2002, definition 2.6).
        var figures = Of([.. new double[990], .. Enumerable.Range(1, 10).Select(i => i * 10.0)], Adverse.High, 0.9925, 0.99, 0.98);

        Assert.Equal([30, 0, 0], figures.Levels.Select(level => level.Var.Value));
        Assert.Equal(((0.5 * 30) + 40 + 50 + 60 + 70 + 80 + 90 + 100) / 7.5, figures.Levels[0].Tvar.Value, 1e-9);
        Assert.Equal(55, figures.Levels[1].Tvar.Value, 1e-9);
        Assert.Equal(27.5, figures.Levels[2].Tvar.Value, 1e-9);
    }

    [Fact]
    public void Where_low_values_hurt_the_figures_are_those_of_the_sample_with_its_sign_turned()
    {
        var values = AwkwardStreams.Create("normal", 50_000).Select(z => Math.Exp(0.3 * z)).ToArray();

        var low = Of(values, Adverse.Low, 0.99, 0.995);
        var turned = Of([.. values.Select(x => -x)], Adverse.High, 0.99, 0.995);

        foreach (var (a, b) in low.Levels.Zip(turned.Levels))
        {
            Assert.True(a.Var.Value < 1 && a.Tvar.Value < a.Var.Value);
            AssertMirrored(a.Var, b.Var);
            AssertMirrored(a.Tvar, b.Tvar);
        }
    }

    [Fact]
    public void A_constant_outcome_has_no_error_and_no_skewness()
    {
        var figures = Of(Enumerable.Repeat(3.7, 5000).ToArray(), Adverse.High, 0.99);

        var exact = new Estimate(3.7, 0, 3.7, 3.7, null);
        Assert.Equal(exact, figures.Mean);
        Assert.Equal(new Estimate(0, 0, 0, 0, null), figures.Sd);
        Assert.Equal(Estimate.Without(0, "no spread"), figures.Skewness);
        Assert.Equal(exact, figures.Levels[0].Var);
        Assert.Equal(exact, figures.Levels[0].Tvar);
    }

    [Fact]
    public void Below_a_thousand_trials_no_figure_has_an_error()
    {
        var figures = Of(AwkwardStreams.Create("normal", 999), Adverse.High, 0.5);

        Assert.All(All(figures), estimate => Assert.Equal("fewer than 1,000 trials", estimate.Reason));
        Assert.All(All(Of(AwkwardStreams.Create("normal", 1000), Adverse.High, 0.5)), estimate => Assert.NotNull(estimate.StandardError));
    }

    [Fact]
    public void Below_twenty_whole_batches_no_figure_has_an_error_from_batches()
    {
        var few = FiguresByBatches(AwkwardStreams.Create("normal", (20 * Edition.TrialsPerBlock) - 1));
        var enough = FiguresByBatches(AwkwardStreams.Create("normal", 20 * Edition.TrialsPerBlock));

        Assert.All(All(few), estimate => Assert.Equal("fewer than 20 whole batches (19)", estimate.Reason));
        Assert.All(All(enough), estimate => Assert.NotNull(estimate.StandardError));
    }

    [Fact]
    public void A_tail_of_fewer_than_ten_trials_has_figures_without_an_error()
    {
        var levels = Of(AwkwardStreams.Create("normal", 2000), Adverse.High, 0.995, 0.9951).Levels;

        Assert.NotNull(levels[0].Var.StandardError);
        Assert.Equal("tail holds fewer than 10 trials", levels[1].Var.Reason);
        Assert.Equal("tail holds fewer than 10 trials", levels[1].Tvar.Reason);
    }

    [Fact]
    public void Moments_that_one_trial_dominates_have_no_error_while_ranks_do()
    {
        var figures = Of(AwkwardStreams.Create("normal_with_outlier", 100_000), Adverse.High, 0.99);

        const string Reason = "moments dominated by 1 trial";
        Assert.Equal([Reason, Reason, Reason], new[] { figures.Mean, figures.Sd, figures.Skewness }.Select(f => f.Reason));
        Assert.Equal(Reason, figures.Levels[0].Tvar.Reason);
        Assert.NotNull(figures.Levels[0].Var.StandardError);
        Assert.NotNull(figures.Above[0].Probability.StandardError);
    }

    [Fact]
    public void A_handful_of_trials_may_dominate_the_skewness_but_not_the_mean()
    {
        var figures = Of([.. AwkwardStreams.Create("normal", 100_000), 30, -31, 32], Adverse.High, 0.99);

        Assert.NotNull(figures.Mean.StandardError);
        Assert.Equal("moments dominated by 2 trials", figures.Skewness.Reason);
    }

    [Fact]
    public void Power_sums_beyond_a_double_are_named_as_the_reason()
    {
        var figures = Of([.. AwkwardStreams.Create("uniform", 2000).Select(u => u * 1e200)], Adverse.High, 0.9);

        Assert.Equal("moments exceed the range of a double", figures.Mean.Reason);
        Assert.InRange(figures.Mean.Value, 0.4e200, 0.6e200);
        Assert.NotNull(figures.Levels[0].Var.StandardError);
    }

    [Fact]
    public void Errors_of_normal_trials_are_those_of_the_textbook()
    {
        // Normal sample: se of the mean 1/sqrt(n), of the sd 1/sqrt(2n), of the skewness sqrt(6/n); of VaR sqrt(pq/n)/density;
        // of the probability sqrt(pq/n). The sample's own moments move them by a few per cent of themselves at most.
        const int N = 200_000;
        var figures = Of(AwkwardStreams.Create("normal", N), Adverse.High, 0.975);

        Assert.Equal(1, figures.Mean.StandardError!.Value * Math.Sqrt(N), 0.01);
        Assert.Equal(1, figures.Sd.StandardError!.Value * Math.Sqrt(2 * N), 0.01);
        Assert.Equal(1, figures.Skewness.StandardError!.Value * Math.Sqrt(N / 6.0), 0.02);
        var density = MathNet.Numerics.Distributions.Normal.PDF(0, 1, 1.959964);

        // Half the distance of two order statistics with 270 trials between them: known to 6 %.
        Assert.Equal(1, figures.Levels[0].Var.StandardError!.Value * density * Math.Sqrt(N / (0.975 * 0.025)), 0.15);
        var share = figures.Above[0].Probability;
        Assert.Equal(1, share.StandardError!.Value / Math.Sqrt(share.Value * (1 - share.Value) / N), 0.001);
    }

    [Fact]
    public void Closed_forms_and_batches_agree_on_independent_trials()
    {
        // 100 batches know a standard error to 1/sqrt(200) = 7 %: allow four of those.
        var values = AwkwardStreams.Create("normal", 100 * Edition.TrialsPerLeaf);
        var result = FoldedRuns.Fold(values, new OutcomeRequest("x", Adverse.High, [0.5, 0.99], [1]));

        var pairs = All(Figures.Of(result, ErrorMethod.ClosedForm)).Zip(All(Figures.Of(result, ErrorMethod.Batches)));

        Assert.All(pairs, pair =>
        {
            Assert.Equal(pair.First.Value, pair.Second.Value);
            Assert.InRange(pair.Second.StandardError!.Value / pair.First.StandardError!.Value, 0.72, 1.28);
        });
    }

    /// <summary>Equal but for the sketch, whose bulk is cut at other places: a tenth of the error.</summary>
    private static void AssertMirrored(Estimate a, Estimate b)
    {
        var tolerance = a.StandardError!.Value / 10;
        Assert.Equal(-b.Value, a.Value, tolerance);
        Assert.Equal(b.StandardError!.Value, a.StandardError.Value, tolerance);
        Assert.Equal(-b.High!.Value, a.Low!.Value, tolerance);
        Assert.Equal(-b.Low!.Value, a.High!.Value, tolerance);
    }

    private static OutcomeFigures Of(double[] values, Adverse adverse, params double[] levels) =>
        Figures.Of(FoldedRuns.Fold(values, new OutcomeRequest("x", adverse, levels, [1])), ErrorMethod.ClosedForm);

    private static OutcomeFigures FiguresByBatches(double[] values) =>
        Figures.Of(FoldedRuns.Fold(values, new OutcomeRequest("x", Adverse.High, [0.5], [1])), ErrorMethod.Batches);

    private static IEnumerable<Estimate> All(OutcomeFigures figures) =>
        [figures.Mean, figures.Sd, figures.Skewness, .. figures.Levels.SelectMany(level => new[] { level.Var, level.Tvar }), .. figures.Above.Select(above => above.Probability)];
}
