using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Models;

public class TriangleSectionTests
{
    private const string Motor =
        """
        model: m
        triangles:
          motor:
            data: motor.csv
            columns: {origin: year, development: age, amount: paid}
            layout: long
            amounts: incremental
            as_of: 2025-12-31
            method: odp_bootstrap
            process: over_dispersed_poisson
            link_ratios:
              average: simple
              last: 3
              exclude:
                - {origin: 2023, development: 2}
            tail: {factor: 1.01, sd: 0.4%, periods: 2}
            scale: by_development
            zero_residuals: drop
            centre: true
            booked: {best_estimate: 151_200, by: shift}
            stream: cars
        outcomes:
          motor.unpaid: {}
          motor.paid.2029: {}
        """;

    [Fact]
    public void Options_reach_the_method()
    {
        TriangleInput motor = Documents.Accepted(Motor).Triangles[0];

        Assert.Equal(("motor", "cars"), (motor.Name, motor.Stream));
        Assert.Same(Documents.Triangle, motor.Triangle);
        Assert.Equal([(3, 1)], motor.Options.Excluded);
        ReservingOptions expected = new()
        {
            Method = ReservingMethod.OdpBootstrap,
            Process = ProcessError.OverDispersedPoisson,
            Average = LinkRatioAverage.Simple,
            LastPeriods = 3,
            Excluded = motor.Options.Excluded,
            Tail = new TailOptions { Factor = 1.01, Sd = 0.004, Periods = 2 },
            Scale = ScaleForm.ByDevelopment,
            KeepZeroResiduals = false,
            CentreResiduals = true,
            Booked = new BookedEstimate(151_200, BookedForm.Shift),
        };
        Assert.Equal(expected, motor.Options);
    }

    [Fact]
    public void The_data_file_is_asked_for_with_its_layout()
    {
        TriangleRequest? asked = null;
        Documents.Read(Motor, request =>
        {
            asked = request;
            return (Documents.Triangle, []);
        });

        TriangleRequest expected = new()
        {
            FileName = "motor.csv",
            Content = asked!.Content,
            Layout = TriangleLayout.Long,
            Amounts = TriangleAmounts.Incremental,
            OriginColumn = "year",
            DevelopmentColumn = "age",
            AmountColumn = "paid",
            MonthsPerPeriod = 12,
            AsOf = new DateOnly(2025, 12, 31),
        };
        Assert.Equal(expected, asked);
        Assert.Equal([1, 2, 3], asked.Content);
    }

    [Fact]
    public void What_is_wrong_in_the_data_is_told_behind_what_is_wrong_in_the_model()
    {
        Diagnostic wrong = new(Severity.Error, new SourcePosition("motor.csv", 3, 7), "'x' is no number", null);

        ModelReading reading = Documents.Read(Motor + "\n  unknown: {}\n", _ => (null, [wrong]));

        Assert.Null(reading.Model);
        Assert.Equal(["model.yaml:25:3", "motor.csv:3:7"], reading.Diagnostics.Select(d => d.Position.ToString()));
    }

    [Fact]
    public void A_triangle_that_the_method_cannot_be_used_on_is_refused_where_the_model_names_it()
    {
        Triangle exact = new(["2023", "2024", "2025"], [[100, 50, 15], [200, 100], [300]], 12);
        string text = "model: m\ntriangles:\n  fire: {data: fire.csv, amounts: cumulative, method: odp_bootstrap}\noutcomes:\n  fire.unpaid: {}";

        ModelReading reading = Documents.Read(text, _ => (exact, []));

        Assert.Null(reading.Model);
        Assert.Equal(new SourcePosition("model.yaml", 3, 3), reading.Diagnostics[0].Position);
        Assert.Contains("no residual to resample", reading.Diagnostics[0].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_triangle_is_broken_down_both_ways_unless_told_otherwise()
    {
        Model both = Documents.Accepted(Motor);
        Model one = Documents.Accepted(Motor.Replace("motor.unpaid: {}", "motor.unpaid: {by: [calendar]}", StringComparison.Ordinal));
        Model none = Documents.Accepted(Motor.Replace("motor.unpaid: {}", "motor.unpaid: {by: []}", StringComparison.Ordinal));

        Assert.Equal([Breakdown.Origin, Breakdown.Calendar], both.Outcomes[0].By);
        Assert.Empty(both.Outcomes[1].By);
        Assert.Equal([Breakdown.Calendar], one.Outcomes[0].By);
        Assert.Empty(none.Outcomes[0].By);
    }

    [Fact]
    public void A_file_that_two_triangles_name_is_asked_for_once()
    {
        string second = Motor[Motor.IndexOf("  motor:", StringComparison.Ordinal)..Motor.IndexOf("outcomes:", StringComparison.Ordinal)]
            .Replace("  motor:", "  lorries:", StringComparison.Ordinal);
        ModelReading reading = Documents.Read(Motor.Replace("outcomes:", second + "outcomes:", StringComparison.Ordinal));

        Assert.Equal(2, reading.Model!.Triangles.Count);
        Assert.Equal(["motor.csv"], reading.Data.Select(file => file.Name));
    }

    [Fact]
    public void A_data_file_beyond_the_bound_is_refused()
    {
        ModelReading reading = ModelReader.Read(
            "model.yaml", Motor, name => new DataFile(name, new byte[(64 << 20) + 1]), Documents.Forms, _ => (Documents.Triangle, []));

        Assert.Contains("more than 64 MiB", reading.Diagnostics[0].Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("motor.paid.2026", true)]
    [InlineData("motor.paid.2032", true)]
    [InlineData("motor.paid.2025", false)]
    [InlineData("motor.paid.2033", false)]
    [InlineData("motor.unpaid.2023", true)]
    [InlineData("motor.expected", true)]
    public void Payments_run_from_the_latest_diagonal_to_the_end_of_the_tail(string name, bool exists)
    {
        string text = Motor.Replace("motor.paid.2029: {}", name + ": {}", StringComparison.Ordinal);

        Assert.Equal(exists, Documents.Read(text).Model is not null);
    }

    [Theory]
    [InlineData("2023 2024 2025", 12, true)]
    [InlineData("2023Q4 2024Q1 2024Q2", 3, true)]
    [InlineData("2023 2024 2025", 3, false)]
    [InlineData("2023Q4 2024Q5 2024Q6", 3, false)]
    [InlineData("A B C", 12, false)]
    [InlineData("99999999999 2024 2025", 12, false)]
    public void Origins_are_years_or_quarters(string origins, int monthsPerPeriod, bool isRight)
    {
        Triangle triangle = new(origins.Split(' '), [[100, 50, 10], [110, 60], [120]], monthsPerPeriod);
        string text = "model: m\ntriangles:\n  x: {data: x.csv, amounts: cumulative, method: mack}\noutcomes:\n  x.unpaid: {}";

        Assert.Equal(isRight, Documents.Read(text, _ => (triangle, [])).Model is not null);
    }
}
