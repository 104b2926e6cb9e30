using System.Diagnostics;
using System.Text;
using CsCheck;
using Swarm.Engine.Models;

namespace Swarm.Engine.Tests.Models;

public class HostileDocumentTests
{
    // Generous for a busy machine; what is guarded against would take minutes or never end.
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(20);

    // Several times what the longest allowed document takes, far below what an expanded one would.
    private const long MaxBytes = 400L << 20;

    public static TheoryData<string, string, string> Documents => new()
    {
        { "lists in lists", new string('[', 1_000_000), "more than 32 deep" },
        { "mappings in mappings", Repeat("{a: ", 200_000), "more than 32 deep" },
        { "lists in lists by dashes", Repeat("- ", 500_000), "more than 32 deep" },
        { "complex keys", Repeat("? ", 500_000), "more than 32 deep" },
        { "an indented staircase", Staircase(1_000), "more than 32 deep" },
        { "a million laughs", Laughs(), "blow the document up" },
        { "an alias of itself", "model: &a [*a]\noutcomes: {a: {}}", "no entry above is marked" },
        { "tens of thousands of keys", "model: m\nformulas:\n" + Lines(60_000, i => $"  k{i}: 1"), "more than 100,000 entries" },
        { "more quantities than allowed", "model: m\nformulas:\n" + Lines(10_001, i => $"  k{i}: 1") + "outcomes:\n  k1: {}", "10,001 quantities" },
        { "more steps than allowed", "model: m\nhorizon: 10000\nformulas:\n" + Lines(200, i => $"  k{i}[t]: 1") + "outcomes:\n  k1[t]: {}", "times steps" },
        { "more references than allowed", Woven(90, 10_000), "references of formulas times steps" },
        { "more reported values than allowed", "model: m\nhorizon: 9000\nformulas:\n  a[t]: 1\n  b[t]: 2\noutcomes:\n  a[t]: {}\n  b[t]: {}", "values are reported" },
        { "a long text", "model: " + new string('x', 1_000_000), "longer than 200" },
        { "a longer text", "model: " + new string('x', 1 << 20), "longer than 1,048,576" },
        { "a long name", $"model: m\nformulas:\n  {new string('x', 900)}: 1\noutcomes:\n  x: {{}}", "longer than 100" },
        { "a long formula", "model: m\nformulas:\n  x: " + Repeat("1 + ", 200_000) + "1\noutcomes:\n  x: {}", "longer than 10,000" },
        { "a long list", "model: m\nformulas:\n  x: 1\noutcomes:\n  x: {above: [" + Repeat("1,", 40_000) + "1]}", "at most 100" },
        { "an unclosed quote", "model: \"" + Repeat("x\n  ", 200_000), "" },
        { "quotes in a row", "model: " + Repeat("''", 500_000), "longer than 200" },
        { "a control character", "model: a\u0001b", "U+0001" },
        { "a zero character", "model: a\0b", "U+0000" },
        { "half a surrogate pair", "model: a\uD800b", "U+D800" },
        { "text that runs backwards", "model: a\u202Eb", "U+202E" },
        { "a byte order mark inside", "model: a\uFEFFb", "U+FEFF" },
        { "comments only", Repeat("#\n", 500_000), "is empty" },
        { "line ends only", Repeat("\r\n", 500_000), "is empty" },
        { "a misspelling in each of many entries", "model: m\nformulas:\n" + Lines(9_000, i => $"  quantity_{i}: quantitx_{i}") + "outcomes:\n  quantity_1: {}", "only the first 100" },
    };

    [Theory]
    [MemberData(nameof(Documents))]
    public void A_hostile_document_is_refused_quickly(string name, string text, string expected)
    {
        long before = GC.GetAllocatedBytesForCurrentThread();
        Stopwatch watch = Stopwatch.StartNew();

        ModelReading reading = Models.Documents.Read(text);

        Assert.True(watch.Elapsed < Patience, $"{name}: {watch.Elapsed}");
        Assert.True(GC.GetAllocatedBytesForCurrentThread() - before < MaxBytes, $"{name}: {(GC.GetAllocatedBytesForCurrentThread() - before) >> 20} MiB");
        Assert.Null(reading.Model);
        Assert.Contains(reading.Diagnostics, d => d.ToString().Contains(expected, StringComparison.Ordinal));
        Assert.All(reading.Diagnostics, d => Assert.True(d.ToString().Length < 1_000, name));
        Assert.True(reading.Diagnostics.Count <= 201);
    }

    [Fact]
    public void A_chain_as_long_as_the_horizon_is_followed_without_the_stack()
    {
        string text = "model: m\nhorizon: 10000\nformulas:\n  x[0]: 1\n" + Lines(80, i => $"  y{i}[t]: {(i == 0 ? "x[t-1]" : $"y{i - 1}[t]")}") + "  x[t]: y79[t]\noutcomes:\n  x[horizon]: {}";

        Assert.NotNull(Models.Documents.Read(text).Model);
    }

    [Fact]
    public void A_circle_through_a_long_chain_is_told_in_a_line()
    {
        string text = "model: m\nhorizon: 10000\nformulas:\n  x[0]: x[horizon]\n  x[t]: x[t-1]\noutcomes:\n  x[horizon]: {}";

        Assert.Contains("x[0] -> x[10000] -> x[9999]", Models.Documents.Told(text)[0], StringComparison.Ordinal);
        Assert.True(Models.Documents.Told(text)[0].Length < 300);
    }

    [Fact]
    public void A_damaged_document_never_breaks_the_reader()
    {
        string[] texts = [.. AcceptedModel.All.Select(a => a.Text)];
        Gen.Select(Gen.Int[0, texts.Length - 1], Gen.Int[0, 1_000], Gen.Int[0, 6], Gen.Char["\n\t :-[]{}()\"'&*!#|>%@`,?\\=ab0\u00e9\u0085"].Array[0, 4])
            .Sample(
                (which, at, removed, added) =>
                {
                    string text = texts[which];
                    int start = at % text.Length;
                    string damaged = text.Remove(start, Math.Min(removed, text.Length - start)).Insert(start, new string(added));
                    ModelReading reading = Models.Documents.Read(damaged);
                    return reading.Model is null == reading.Diagnostics.Any(d => d.Severity == Severity.Error);
                },
                iter: 20_000,
                seed: "0N0XIzNsQ0O2");
    }

    private static string Repeat(string text, int times) => new StringBuilder().Insert(0, text, times).ToString();

    private static string Lines(int count, Func<int, string> line) => string.Concat(Enumerable.Range(0, count).Select(i => line(i) + "\n"));

    private static string Staircase(int depth) => Lines(depth, i => new string(' ', i) + "a:");

    private static string Laughs() => "a0: &a0 [x, x, x, x, x, x, x, x, x, x]\n" + Lines(20, i => $"a{i + 1}: &a{i + 1} [{string.Join(", ", Enumerable.Repeat("*a" + i, 10))}]");

    /// <summary>Formulas each of which looks at all others one step back.</summary>
    private static string Woven(int count, int horizon)
    {
        string all = string.Join(" + ", Enumerable.Range(0, count).Select(i => $"k{i}[t-1]"));
        return $"model: m\nhorizon: {horizon}\nformulas:\n" + Lines(count, i => $"  k{i}[0]: 1\n  k{i}[t]: {all}") + "outcomes:\n  k0[t]: {}";
    }
}
