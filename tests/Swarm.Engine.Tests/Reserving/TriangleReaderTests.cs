using System.Text;
using CsCheck;
using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Reserving;

public sealed class TriangleReaderTests
{
    private const string Long = """
        # invented
        Origin,Development,Amount
        2021,1,100
        2021,2,150
        2021,3,160.5
        2022,1,1_200
        2022,2,-1.5e2
        2023,1,.5
        """;

    [Fact]
    public void The_long_form_gives_cells_by_origin_and_development()
    {
        Triangle triangle = Good(Triangles.Request(Long) with { Amounts = TriangleAmounts.Incremental });

        Assert.Equal(["2021", "2022", "2023"], triangle.Origins);
        Assert.Equal(12, triangle.MonthsPerPeriod);
        Assert.Equal([100, 150, 160.5], Row(triangle, 0));
        Assert.Equal([1200, -150], Row(triangle, 1));
        Assert.Equal([0.5], Row(triangle, 2));
    }

    [Fact]
    public void A_square_table_gives_the_same_triangle_as_the_long_form()
    {
        Triangle square = Good(Triangles.Request("""
            accident year;1;2;3
            2021;100;150;160.5
            2022;1200;-150;
            2023;0.5
            """) with { Amounts = TriangleAmounts.Incremental });

        AssertSame(Good(Triangles.Request(Long) with { Amounts = TriangleAmounts.Incremental }), square);
    }

    [Fact]
    public void Developments_may_be_counted_in_months()
    {
        Triangle yearly = Good(Triangles.Request("origin,24,12\n2020,30,10\n2021,,20\n"));
        Triangle quarterly = Good(Triangles.Request("origin,3,6,9\n2020Q4,1,2,4\n2021q1,3,9,\n2021Q2,5,,\n"));

        Assert.Equal([10, 20], Row(yearly, 0));
        Assert.Equal(3, quarterly.MonthsPerPeriod);
        Assert.Equal(["2020Q4", "2021Q1", "2021Q2"], quarterly.Origins);
        Assert.Equal([1, 1, 2], Row(quarterly, 0));
    }

    [Fact]
    public void Headers_may_be_named_in_the_model_and_other_columns_are_left_alone()
    {
        Triangle triangle = Good(Triangles.Request("line\tAY\tage\tpaid\nmotor\t2020\t1\t10\n") with
        {
            OriginColumn = "ay",
            DevelopmentColumn = "Age",
            AmountColumn = "PAID",
        });

        Assert.Equal([10], Row(triangle, 0));
    }

    [Fact]
    public void A_byte_order_mark_quotes_comments_empty_lines_and_foreign_line_ends_are_no_data()
    {
        Triangle triangle = Good(Triangles.Request(
            "\uFEFF\"origin\", \"development\" ,amount\r\n\r\n# \"half a quote\r\n2020,1, \"10\"\r\n2020,2,12\r\n\r\n2021,1,11\r\n"));

        Assert.Equal([10, 2], Row(triangle, 0));
    }

    [Fact]
    public void A_table_wider_or_narrower_than_its_origins_is_a_run_off_shape()
    {
        Triangle narrow = Good(Triangles.Request("origin,1,2\n2019,1,2\n2020,1,2\n2021,1,2\n2022,1,\n"));
        Triangle wide = Good(Triangles.Request("origin,1,2,3\n2019,1,2,3\n2020,1,2,\n"));

        Assert.Equal([2, 2, 2, 1], Enumerable.Range(0, 4).Select(narrow.Known));
        Assert.Equal([3, 2], Enumerable.Range(0, 2).Select(wide.Known));
    }

    [Fact]
    public void The_date_of_the_latest_diagonal_is_checked()
    {
        TriangleRequest request = Triangles.Request(Long);

        Good(request with { AsOf = new DateOnly(2023, 12, 31) });
        AssertFault(
            request with { AsOf = new DateOnly(2024, 12, 31) }, 8, 8, "the latest diagonal is 2023, but as_of 2024-12-31 lies in 2024");
        (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = TriangleReader.Read(
            request with { AsOf = new DateOnly(2023, 6, 30) });
        Assert.NotNull(triangle);
        Assert.Equal(Severity.Warning, Assert.Single(diagnostics).Severity);
    }

    [Fact]
    public void Cumulative_and_incremental_readings_agree() =>
        Gen.Int[-500, 5_000].Array[3, 8].Array[3, 8].Sample(rows =>
        {
            int developments = rows.Min(row => row.Length);
            double[][] increments = [.. rows.Select((row, i) => row
                .Take(Math.Max(1, Math.Min(developments, rows.Length - i))).Select(x => (double)x).ToArray())];
            Triangle incremental = Good(Triangles.Request(LongText(increments)) with { Amounts = TriangleAmounts.Incremental });
            Triangle cumulative = Good(Triangles.Request(LongText([.. increments.Select(RunningSums)])));
            Triangle square = Good(Triangles.Request(SquareText([.. increments.Select(RunningSums)])));

            AssertSame(incremental, cumulative);
            AssertSame(incremental, square);
        });

    [Fact]
    public void The_order_of_rows_means_nothing() =>
        Gen.Shuffle(Long.Split('\n')[2..]).Sample(rows =>
        {
            string text = string.Join('\n', [.. Long.Split('\n')[..2], .. rows]);
            AssertSame(Good(Triangles.Request(Long)), Good(Triangles.Request(text)));
        });

    [Fact]
    public void No_text_whatever_makes_the_reader_fail() =>
        Gen.OneOf(
            Gen.String[Gen.Char["origindevelopmentamount0123456789,;\t|\"'#\n\r.-+_eE Q\0\u00e9"], 0, 200],
            Gen.String[Gen.Char["0123456789,\n\""], 0, 60].Select(tail => "origin,development,amount\n2020,1,5\n" + tail)).Sample(text =>
        {
            (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = TriangleReader.Read(Triangles.Request(text));
            Assert.Equal(triangle is null, diagnostics.Any(d => d.Severity == Severity.Error));
        });

    private static void AssertFault(TriangleRequest request, int line, int column, string message)
    {
        Diagnostic diagnostic = Assert.Single(TriangleReader.Read(request).Diagnostics);
        Assert.Equal(new SourcePosition("paid.csv", line, column), diagnostic.Position);
        Assert.Equal(message, diagnostic.Message);
    }

    private static Triangle Good(TriangleRequest request)
    {
        (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = TriangleReader.Read(request);
        Assert.Empty(diagnostics);
        return triangle!;
    }

    private static void AssertSame(Triangle expected, Triangle actual)
    {
        Assert.Equal(expected.Origins, actual.Origins);
        Assert.Equal(expected.MonthsPerPeriod, actual.MonthsPerPeriod);
        Assert.All(Enumerable.Range(0, expected.Origins.Count), i => Assert.Equal(Row(expected, i), Row(actual, i)));
    }

    private static double[] Row(Triangle triangle, int origin) =>
        [.. Enumerable.Range(0, triangle.Known(origin)).Select(j => triangle.Incremental(origin, j))];

    private static double[] RunningSums(double[] row) => [.. row.Select((_, j) => row[..(j + 1)].Sum())];

    private static string LongText(double[][] rows)
    {
        var text = new StringBuilder("origin,development,amount\n");
        for (int i = 0; i < rows.Length; i++)
        {
            for (int j = 0; j < rows[i].Length; j++)
            {
                text.Append($"{2001 + i},{j + 1},{rows[i][j]:R}\n");
            }
        }

        return text.ToString();
    }

    private static string SquareText(double[][] rows) =>
        "origin," + string.Join(',', Enumerable.Range(1, rows[0].Length)) + "\n"
        + string.Concat(rows.Select((row, i) => $"{2001 + i},{string.Join(',', row)}\n"));
}
