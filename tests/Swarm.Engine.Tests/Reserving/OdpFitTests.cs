using Swarm.Engine.Reserving;
using static Swarm.Engine.Tests.Reserving.ReferenceValues;

namespace Swarm.Engine.Tests.Reserving;

public sealed class OdpFitTests
{
    private const string Part = "odp_glm";

    public static TheoryData<string> Published => [.. Triangles.Published];

    [Theory]
    [MemberData(nameof(Published))]
    public void Means_and_residuals_are_those_of_the_generalised_linear_model(string name)
    {
        OdpFit fit = Triangles.Odp(Triangles.Load(name));

        foreach ((string index, double value) in Of(name, Part, "fitted_incremental"))
        {
            (int i, int j) = Cell(index);
            bool isKnown = j < fit.Triangle.Known(i);
            AssertClose(value, isKnown ? fit.Mean(i, j) : fit.ChainLadder.FutureIncrement(i, j), 1e-9);
        }

        foreach ((string index, double value) in Of(name, Part, "pearson_residuals_unadjusted"))
        {
            (int i, int j) = Cell(index);
            Residual residual = Assert.Single(fit.Residuals, r => r.Origin == i && r.Development == j);
            AssertClose(value, residual.Pearson, 0, 1e-7);
        }
    }

    [Theory]
    [MemberData(nameof(Published))]
    public void Scale_and_degrees_of_freedom_are_those_of_the_generalised_linear_model(string name)
    {
        OdpFit fit = Triangles.Odp(Triangles.Load(name));

        Assert.Equal(One(name, Part, "n_cells"), fit.Count);
        Assert.Equal(One(name, Part, "n_parameters"), fit.Parameters);
        AssertClose(One(name, Part, "phi_pearson"), Assert.Single(fit.Scales).Scale, 1e-8);
    }

    [Theory]
    [MemberData(nameof(Published))]
    public void Closed_form_prediction_errors_are_those_of_England_and_Verrall_1999(string name)
    {
        OdpPredictionErrors errors = OdpPredictionErrors.Of(Triangles.Odp(Triangles.Load(name)))!;
        double[] byOrigin = List(name, Part, "prediction_error_by_origin");

        AssertClose(byOrigin, byOrigin.Select((_, i) => errors.Origin(i).StandardError), 1e-8);
        AssertClose(List(name, Part, "estimation_error_by_origin"), byOrigin.Select((_, i) => errors.Origin(i).Parameter), 1e-8);
        AssertClose(One(name, Part, "prediction_error_total"), errors.Total.StandardError, 1e-8);
        AssertClose(One(name, Part, "estimation_error_total"), errors.Total.Parameter, 1e-8);
        AssertClose(One(name, Part, "process_error_total"), errors.Total.Process, 1e-8);
    }

    [Fact]
    public void The_pool_holds_adjusted_residuals_whose_mean_square_is_the_scale()
    {
        OdpFit fit = Triangles.Odp(Triangles.Load("taylor-ashe"));

        Assert.Equal(55, fit.Pool.Count);
        AssertClose(Math.Sqrt(55.0 / 36), fit.BiasAdjustment, 1e-15);
        AssertClose(fit.Scale(0), fit.Pool.Average(r => r * r), 1e-12);
        Assert.Equal(2, fit.Pool.Count(r => r == 0));
    }

    [Fact]
    public void Residuals_that_are_zero_by_construction_can_be_left_out_of_the_pool()
    {
        Triangle triangle = Triangles.Load("taylor-ashe");
        OdpFit kept = Triangles.Odp(triangle);
        OdpFit dropped = Triangles.Odp(triangle, new ReservingOptions { KeepZeroResiduals = false });

        Assert.Equal(kept.Pool.Where(r => r != 0), dropped.Pool);
        Assert.Equal(kept.Scale(0), dropped.Scale(0));
    }

    [Fact]
    public void A_centred_pool_has_mean_zero()
    {
        OdpFit fit = Triangles.Odp(Triangles.Load("taylor-ashe"), new ReservingOptions { CentreResiduals = true });

        Assert.Equal(0, fit.Pool.Average(), 1e-10);
    }

    [Fact]
    public void A_scale_by_development_pools_the_periods_where_one_residual_is_left()
    {
        Triangle triangle = Triangles.Load("taylor-ashe");
        double constant = Triangles.Odp(triangle).Scale(0);
        OdpFit fit = Triangles.Odp(triangle, new ReservingOptions { Scale = ScaleForm.ByDevelopment });

        Assert.Equal(
            [(0, 10), (1, 9), (2, 8), (3, 7), (4, 6), (5, 5), (6, 4), (7, 3), (9, 3)],
            fit.Scales.Select(group => (group.Last, group.Residuals)));
        Assert.Equal((8, 1), (fit.Scales[^1].First, fit.Scales[^1].ZerosByConstruction));
        AssertClose(constant, fit.Scales.Sum(group => group.Scale * group.Residuals) / fit.Count, 1e-12);
        Assert.All(
            fit.Scales,
            group => AssertClose(
                1,
                fit.Residuals.Where(r => r.Development >= group.First && r.Development <= group.Last)
                    .Average(r => r.Scaled * r.Scaled) * fit.BiasAdjustment * fit.BiasAdjustment,
                1e-12));
    }

    [Fact]
    public void Pseudo_data_of_a_cells_own_residual_leave_the_bias_adjustment_alone_different()
    {
        foreach (ScaleForm form in Enum.GetValues<ScaleForm>())
        {
            OdpFit fit = Triangles.Odp(Triangles.Load("mw2008"), new ReservingOptions { Scale = form });

            for (int k = 0; k < fit.Pool.Count; k++)
            {
                Residual r = fit.Residuals[k];
                double pseudo = fit.Mean(r.Origin, r.Development) + (fit.Spread(r.Origin, r.Development) * fit.Pool[k]);
                AssertClose(r.Fitted + (fit.BiasAdjustment * (r.Observed - r.Fitted)), pseudo, 1e-9);
            }
        }
    }

    [Fact]
    public void An_excluded_link_ratio_takes_its_cell_out_of_the_pool_and_one_degree_of_freedom()
    {
        OdpFit fit = Triangles.Odp(Triangles.Load("taylor-ashe"), new ReservingOptions { Excluded = [(3, 2)] });

        Assert.Equal((54, 19), (fit.Count, fit.Parameters));
        Residual excluded = Assert.Single(fit.Residuals, r => !r.IsCounted);
        Assert.Equal((3, 3), (excluded.Origin, excluded.Development));
        Assert.Equal(54, fit.Pool.Count);
        Assert.Null(OdpPredictionErrors.Of(fit));
    }

    [Fact]
    public void Degrees_of_freedom_are_counted_link_ratios_less_factors()
    {
        Triangle triangle = Triangles.Load("taylor-ashe");
        ReservingOptions[] choices =
        [
            new(), new() { LastPeriods = 3 }, new() { LastPeriods = 5, Excluded = [(7, 1)] }, new() { Excluded = [(0, 0), (4, 0), (2, 5)] },
        ];

        foreach (ReservingOptions options in choices)
        {
            OdpFit fit = Triangles.Odp(triangle, options);
            int ratios = Enumerable.Range(0, 9).Sum(fit.ChainLadder.Ratios.CountAt);
            Assert.Equal(ratios - 9, fit.Count - fit.Parameters);
        }
    }

    [Fact]
    public void A_development_without_any_amount_is_fitted_by_zero_and_has_no_residual()
    {
        Triangle triangle = Triangles.OfCumulative(
            [100, 160, 180, 180, 180], [110, 170, 188, 188], [95, 150, 171], [120, 185], [105]);
        OdpFit fit = Triangles.Odp(triangle);

        Assert.All([(0, 3), (1, 3), (0, 4)], cell => Assert.Equal(0, fit.Mean(cell.Item1, cell.Item2)));
        Assert.Equal((12, 7), (fit.Count, fit.Parameters));
        Assert.NotNull(OdpPredictionErrors.Of(fit));
    }

    private static (int Origin, int Development) Cell(string index)
    {
        string[] parts = index.Split('.');
        return (int.Parse(parts[0]), int.Parse(parts[1]));
    }
}
