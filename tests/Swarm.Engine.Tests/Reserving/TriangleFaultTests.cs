using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>What is wrong with a triangle's file, and where.</summary>
public sealed class TriangleFaultTests
{
    [Theory]
    [InlineData("", "1:1", "the file is empty")]
    [InlineData("# nothing\n\n", "1:1", "the file is empty")]
    [InlineData("origin,development,amount\n", "1:1", "there is a header but no row below it")]
    [InlineData("a,b\n2020,1\n", "1:1", "the header 'a, b' is of neither form")]
    [InlineData("origin,development\n2020,1\n", "1:1", "there is no column 'amount'")]
    [InlineData("origin,1,x\n2020,1,2\n", "1:1", "the header 'origin, 1, x' is of neither form")]
    [InlineData("origin,1,1\n2020,1,2\n", "1:10", "development 1 heads two columns")]
    [InlineData("origin,0,1\n2020,1,2\n", "1:8", "'0' is not a development period")]
    public void A_header_without_data_or_meaning(string text, string place, string message) => AssertFault(text, place, message);

    [Theory]
    [InlineData("12 a", "the amount '12 a' is not a number")]
    [InlineData("1 234", "the amount '1 234' is not a number")]
    [InlineData("1'234", "the amount '1'234' is not a number")]
    [InlineData("\"1,234\"", "the amount '1,234' is not a number")]
    [InlineData("(12)", "the amount '(12)' is not a number")]
    [InlineData("1__2", "the amount '1__2' is not a number")]
    [InlineData("_12", "the amount '_12' is not a number")]
    [InlineData("0x10", "the amount '0x10' is not a number")]
    [InlineData("NaN", "the amount 'NaN' is not finite")]
    [InlineData("-Infinity", "the amount '-Infinity' is not finite")]
    [InlineData("1e999", "the amount '1e999' is beyond 1e+15")]
    [InlineData("", "the amount is missing")]
    public void An_amount_that_is_no_plain_number(string amount, string message) =>
        AssertFault($"origin,development,amount\n2020,1,  {amount}\n", amount.Length == 0 ? "2:8" : "2:10", message);

    [Theory]
    [InlineData("FY20", "'FY20' is not an origin period")]
    [InlineData("2020Q5", "'2020Q5' is not an origin period")]
    [InlineData("2020.5", "'2020.5' is not an origin period")]
    [InlineData("", "'' is not an origin period")]
    public void An_origin_that_is_neither_year_nor_quarter(string origin, string message) =>
        AssertFault($"origin,development,amount\n{origin},1,5\n", "2:1", message);

    [Theory]
    [InlineData("1,2,3\n2020,1\n", "2:1", "the row has 2 fields, the header 3")]
    [InlineData("1,2,3\n2020,1,2,3,4\n", "2:1", "the row has 5 fields, the header 3")]
    public void A_row_with_another_number_of_fields(string rest, string place, string message) =>
        AssertFault("origin,development,amount" + rest[5..], place, message);

    [Fact]
    public void A_thousands_comma_makes_a_field_too_many_in_a_square_table() =>
        AssertFault("origin,1,2\n2020,1,234,5\n", "2:12", "the row has 4 fields, the header 3");

    [Fact]
    public void A_cell_that_stands_twice() =>
        AssertFault(
            "origin,development,amount\n2020,1,5\n2021,1,5\n2020,2,6\n2020,1,5\n", "5:8",
            "origin 2020, development 1 stands twice; first on line 2");

    [Fact]
    public void An_origin_that_stands_twice_in_a_square_table() =>
        AssertFault("origin,1,2\n2020,1,2\n2021,1\n2020,1,2\n", "4:1", "origin 2020 stands twice; first on line 2");

    [Fact]
    public void A_gap_within_an_origin() =>
        AssertFault(
            "origin,1,2,3,4\n2020,1,2,3,4\n2021,1,,,4\n", "3:10", "origin 2021 has development 4 but not developments 2 to 3");

    [Fact]
    public void An_origin_that_is_not_there() =>
        AssertFault("origin,1,2,3\n2020,1,2,3\n2022,1,,\n", "3:6", "there is no origin 2021 before origin 2022");

    [Fact]
    public void An_origin_that_ends_before_the_latest_diagonal() =>
        AssertFault(
            "origin,1,2,3\n2020,1,2,3\n2021,1,,\n2022,1,,\n", "3:6",
            "origin 2021 ends at development 1, but the latest diagonal is 2022: development 2 is missing");

    [Fact]
    public void A_cell_beyond_the_latest_diagonal() =>
        AssertFault(
            "origin,1,2,3\n2020,1,2,3\n2021,1,2,3\n2022,1,,\n", "3:10",
            "origin 2021, development 3 lies beyond the latest diagonal, 2022");

    [Theory]
    [InlineData("2,3", "development 2 is neither a number of periods counted from 1 nor a multiple of 12 months")]
    [InlineData("12,18", "development 18 is neither a number of periods counted from 1 nor a multiple of 12 months")]
    public void Developments_of_no_known_unit(string header, string message)
    {
        Diagnostic diagnostic = Assert.Single(Read(Triangles.Request($"origin,{header}\n2020,1,2\n")));
        Assert.Equal(message, diagnostic.Message);
    }

    [Fact]
    public void Years_among_quarters() =>
        AssertFault("origin,1,2\n2020Q1,1,2\n2021,1\n", "3:6", "origin 2021 is not a quarter");

    [Fact]
    public void A_period_that_the_model_names_otherwise()
    {
        Diagnostic diagnostic = Assert.Single(Read(Triangles.Request("origin,1\n2020,1\n") with { MonthsPerPeriod = 3 }));
        Assert.Equal("write origins as 2017Q3, or period: year in the model if all are years", diagnostic.Hint);
    }

    [Fact]
    public void A_layout_that_the_model_names_otherwise()
    {
        TriangleRequest square = Triangles.Request("origin,1\n2020,1\n") with { Layout = TriangleLayout.Long };
        TriangleRequest list = Triangles.Request("origin,development,amount\n2020,1,1\n") with { Layout = TriangleLayout.Square };

        Assert.Equal("the header is that of a square table", Assert.Single(Read(square)).Message);
        Assert.Equal("the header is that of the long form", Assert.Single(Read(list)).Message);
    }

    [Fact]
    public void A_triangle_beyond_the_bounds()
    {
        AssertFault("origin,1\n1800,1\n2020,1\n", "3:6", "origin 2020 is more than 200 periods after origin 1800");
        AssertFault(
            "origin,development,amount\n2020,1,1\n2020,201,1\n", "3:10",
            "development 201 is beyond the 200 periods that a triangle may have");
    }

    [Fact]
    public void A_text_that_is_not_utf8()
    {
        byte[] bytes = [.. "origin,1\n20"u8, 0xE9, .. "20,1\n"u8];
        Diagnostic diagnostic = Assert.Single(Read(Triangles.Request("") with { Content = bytes }));

        Assert.Equal("paid.csv:2:3: error: the text is not UTF-8; save the file as CSV in UTF-8", diagnostic.ToString());
    }

    [Fact]
    public void A_quote_that_is_not_closed() =>
        AssertFault("origin,1\n2020,\"1\n", "2:6", "a quote opens a field that does not end on its line");

    [Fact]
    public void All_errors_are_told_at_once_in_the_order_of_the_file()
    {
        IReadOnlyList<Diagnostic> diagnostics = Read(Triangles.Request("""
            origin,development,amount
            2020,1,ten
            2020,2,12,
            yr21,0,9
            2021,1,NaN
            """));

        Assert.Equal(["2:8", "3:1", "4:1", "4:6", "5:8"], diagnostics.Select(Place));
    }

    [Fact]
    public void Very_many_errors_are_cut_short()
    {
        string rows = string.Concat(Enumerable.Range(0, 300).Select(_ => "2020,x,1\n"));
        IReadOnlyList<Diagnostic> diagnostics = Read(Triangles.Request("origin,development,amount\n" + rows));

        Assert.Equal(51, diagnostics.Count);
        Assert.Equal("there are 250 more errors and warnings from here on", diagnostics[^1].Message);
    }

    private static IReadOnlyList<Diagnostic> Read(TriangleRequest request)
    {
        (Triangle? triangle, IReadOnlyList<Diagnostic> diagnostics) = TriangleReader.Read(request);
        Assert.Null(triangle);
        return diagnostics;
    }

    private static void AssertFault(string text, string place, string message)
    {
        Diagnostic diagnostic = Assert.Single(Read(Triangles.Request(text)));
        Assert.Equal((place, message), (Place(diagnostic), diagnostic.Message));
        Assert.Equal("paid.csv", diagnostic.Position.File);
        Assert.False(string.IsNullOrEmpty(diagnostic.Hint));
    }

    private static string Place(Diagnostic diagnostic) => $"{diagnostic.Position.Line}:{diagnostic.Position.Column}";
}
