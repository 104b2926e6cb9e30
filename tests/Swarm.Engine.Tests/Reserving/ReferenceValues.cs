using System.Globalization;

namespace Swarm.Engine.Tests.Reserving;

/// <summary>Values of Data/reserving-reference.csv, which names their sources.</summary>
internal static class ReferenceValues
{
    private static readonly ILookup<(string Case, string Name), (string Index, double Value)> s_values =
        TestFile.Lines("reserving-reference.csv")
            .Select(line => line.Split(','))
            .ToLookup(f => (f[0], f[1]), f => (f[2], double.Parse(f[3], CultureInfo.InvariantCulture)));

    public static double One(string triangle, string part, string name) => Assert.Single(Of(triangle, part, name)).Value;

    public static double[] List(string triangle, string part, string name) => [.. Of(triangle, part, name).Select(v => v.Value)];

    /// <summary>Values with an index such as 3.0 (a cell) or 0.995 (a level).</summary>
    public static IReadOnlyList<(string Index, double Value)> Of(string triangle, string part, string name)
    {
        (string, double)[] values = [.. s_values[($"{triangle.Replace('-', '_')}.{part}", name)]];
        Assert.NotEmpty(values);
        return values;
    }

    /// <summary>Fails unless two numbers agree to a relative tolerance, or an absolute one where that allows more.</summary>
    public static void AssertClose(double expected, double actual, double relative, double absolute = 0) =>
        Assert.True(
            Math.Abs(expected - actual) <= Math.Max(absolute, relative * Math.Abs(expected)),
            string.Create(CultureInfo.InvariantCulture, $"expected {expected:R}, actual {actual:R}"));

    public static void AssertClose(double[] expected, IEnumerable<double> actual, double relative, double absolute = 0)
    {
        double[] values = [.. actual];
        Assert.Equal(expected.Length, values.Length);
        for (int k = 0; k < values.Length; k++)
        {
            AssertClose(expected[k], values[k], relative, absolute);
        }
    }
}
