using Swarm.Engine.Reserving;
using static Swarm.Engine.Tests.Reserving.ReferenceValues;

namespace Swarm.Engine.Tests.Reserving;

public sealed class ReservingDiagnosticsTests
{
    // Mack (1994), appendix H, on the triangle of Data/reserving-mack1994.csv: Z = 14, E(Z) = 12.875, Var(Z) = 3.978,
    // range 8.886 to 16.864; from memory.
    [Fact]
    public void The_calendar_year_test_is_that_of_Mack_1994()
    {
        CalendarYearTest test = CalendarYearTest.Of(Triangles.ChainLadder(Triangles.Load("mack1994")).Ratios);

        Assert.Equal(14, test.Statistic);
        Assert.Equal(12.875, test.Mean, 1e-12);
        Assert.Equal(3.978, test.Variance, 0.001);
        Assert.Equal(8.886, test.Low, 0.0005);
        Assert.Equal(16.864, test.High, 0.0005);
        Assert.False(test.IsRejected);
    }

    // n tosses of a fair coin, counted one by one.
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(5)]
    [InlineData(12)]
    public void Moments_of_the_smaller_count_are_those_of_all_outcomes(int n)
    {
        double[] smaller = [.. Enumerable.Range(0, 1 << n).Select(toss => int.PopCount(toss)).Select(large => (double)Math.Min(large, n - large))];
        var count = CalendarYearCount.Of("2020", n / 2, n - (n / 2));

        Assert.Equal(smaller.Average(), count.Mean, 1e-12);
        Assert.Equal(smaller.Average(z => z * z) - (smaller.Average() * smaller.Average()), count.Variance, 1e-12);
    }

    [Fact]
    public void A_year_that_inflates_every_payment_is_found()
    {
        // Ratios into odd calendar years are all large, into even ones all small.
        double[][] rows = new double[12][];
        for (int i = 0; i < rows.Length; i++)
        {
            rows[i] = new double[12 - i];
            for (int j = 0; j < rows[i].Length; j++)
            {
                double wobble = 1e-4 * ((i * 7) + (j * 3) % 5);
                rows[i][j] = j == 0 ? 1_000 : rows[i][j - 1] * ((i + j) % 2 == 0 ? 1.1 : 1.3 + wobble);
            }
        }

        CalendarYearTest test = CalendarYearTest.Of(Triangles.ChainLadder(Triangles.OfCumulative(rows)).Ratios);

        Assert.True(test.IsRejected);
        Assert.True(test.Statistic < test.Low);
    }

    [Fact]
    public void Residuals_are_gathered_by_origin_development_and_calendar_period()
    {
        ReservingFit fit = ReservingFit.Of(Triangles.Load("taylor-ashe"), new ReservingOptions(), [])!;
        ResidualTable table = ResidualTable.Of(fit);

        // 55 cells less the two that are zero by construction: the last origin, and the last development.
        Assert.Equal(9, table.ByOrigin.Count);
        Assert.Equal(9, table.ByDevelopment.Count);
        Assert.Equal("2010", table.ByCalendar[^1].Label);
        Assert.All([table.ByOrigin, table.ByDevelopment, table.ByCalendar], groups => Assert.Equal(53, groups.Sum(g => g.Count)));
        AssertClose(36, table.ByCalendar.Sum(g => g.Count * g.MeanSquare), 1e-12);
        Residual[] first = [.. fit.Odp!.Residuals.Where(r => r.Calendar == 0)];
        Assert.Equal(first[0].Scaled, table.ByCalendar[0].Mean);
    }

    [Fact]
    public void Residuals_of_Macks_model_have_the_mean_square_that_its_sigma_was_made_of()
    {
        ReservingFit fit = ReservingFit.Of(Triangles.Load("mw2008"), new ReservingOptions { Method = ReservingMethod.Mack }, [])!;
        ResidualTable table = ResidualTable.Of(fit);

        Assert.Equal(36, table.Residuals.Count);
        foreach (ResidualGroup group in table.ByDevelopment)
        {
            AssertClose(group.Count - 1, group.Count * group.MeanSquare, 1e-10);
        }

        Assert.Equal(["2", "3", "4", "5", "6", "7", "8"], table.ByDevelopment.Select(group => group.Label));
    }

    [Fact]
    public void Booking_by_scaling_or_shift_moves_the_chain_ladder_reserve_to_the_booked_one()
    {
        ChainLadder fit = Triangles.ChainLadder(Triangles.Load("taylor-ashe"));
        Booking scaling = Booking.Of(new BookedEstimate(20e6, BookedForm.Scaling), fit, [])!;
        Booking shift = Booking.Of(new BookedEstimate(20e6, BookedForm.Shift), fit, [])!;

        foreach (Booking booking in new[] { scaling, shift })
        {
            double booked = fit.FutureCells().Sum(cell => (booking.Scale * cell.Mean) + booking.ShiftOf(cell.Mean));
            AssertClose(20e6, booked, 1e-12);
        }

        Assert.Equal((0, 1), (scaling.Shift, shift.Scale));
        Assert.Equal(0, Booking.None.ShiftOf(5));
    }
}
