namespace Swarm.Engine.Tests.Architecture;

public sealed class SizeTests
{
    private const int LongestMethod = 80;

    [Theory]
    [InlineData("src", 500)]
    [InlineData("tests", 700)]
    public void A_source_file_is_short_enough_to_read(string folder, int limit)
    {
        string[] wrong =
        [
            .. from file in SourceTree.Files(folder, "*.cs")
               let lines = File.ReadLines(file).Count()
               where lines > limit
               select $"{SourceTree.Relative(file)} has {lines} lines; {limit} is the limit.",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    [Theory]
    [InlineData("src")]
    [InlineData("tests")]
    public void A_method_is_short_enough_to_read(string folder)
    {
        string[] wrong =
        [
            .. from file in SourceTree.Files(folder, "*.cs")
               from method in SourceText.MethodsLongerThan(LongestMethod, File.ReadAllText(file))
               select $"{SourceTree.Relative(file)}, {method}; {LongestMethod} is the limit of a method.",
        ];

        Assert.True(wrong.Length == 0, string.Join('\n', wrong));
    }

    [Fact]
    public void The_scan_finds_a_long_method_and_passes_by_a_long_type()
    {
        string body = string.Concat(Enumerable.Repeat("        Call(\"}\"); // }\n", 5));
        string source = $"class A(int b)\n{{\n    void C()\n    {{\n{body}    }}\n\n    int D => 1;\n}}\n";

        Assert.Equal(["line 4: 7 lines"], SourceText.MethodsLongerThan(6, source));
        Assert.Empty(SourceText.MethodsLongerThan(7, source));
    }
}
