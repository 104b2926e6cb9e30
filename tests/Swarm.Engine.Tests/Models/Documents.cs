using Swarm.Engine.Distributions;
using Swarm.Engine.Models;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Tests.Models;

/// <summary>Reads documents in tests, with two distributions and a triangle at hand.</summary>
internal static class Documents
{
    public const string FileName = "model.yaml";

    public static IReadOnlyList<DistributionForm> Forms { get; } =
    [
        new(
            "normal",
            [new("mean", ParameterKind.Number, "Mean."), new("sd", ParameterKind.Number, "Standard deviation, zero or more.")],
            "Normal distribution.",
            a => DistributionBinding.Of(
                a.Number("sd") < 0 ? [new ParameterProblem("sd", "'sd' is negative", "write zero or more")] : [],
                () => new Normal(a.Number("mean"), a.Number("sd")))),
        new(
            "lognormal",
            [new("mean", ParameterKind.Number, "Mean."), new("sd", ParameterKind.Number, "Standard deviation.")],
            "Lognormal distribution by its own moments.",
            a => DistributionBinding.Of(Lognormal.OfMeanAndSd(a.Number("mean"), a.Number("sd")))),
        new(
            "lognormal",
            [new("log_mean", ParameterKind.Number, "Mean of the logarithm."), new(
                "log_sd",
                ParameterKind.Number,
                "Its standard deviation.")],
            "Lognormal distribution by the moments of its logarithm.",
            a => DistributionBinding.Of(new Lognormal(a.Number("log_mean"), a.Number("log_sd")))),
        new(
            "one_of",
            [new("values", ParameterKind.Numbers, "Values."), new("chances", ParameterKind.Numbers, "Their chances.")],
            "One of several values.",
            a => DistributionBinding.Of(
                a.Numbers("values").Count != a.Numbers("chances").Count
                    ? [new ParameterProblem("chances", "'chances' and 'values' differ in length", "write one chance a value")]
                    : [],
                () => new OneOf(a.Numbers("values"), a.Numbers("chances")))),
    ];

    /// <summary>Six origin years, whatever the file says.</summary>
    public static Triangle Triangle { get; } = new(
        ["2020", "2021", "2022", "2023", "2024", "2025"],
        [[100, 60, 30, 14, 6, 2], [108, 58, 35, 12, 7], [97, 66, 28, 15], [121, 62, 36], [115, 75], [130]],
        12);

    public static ModelReading Read(string text) => Read(text, _ => (Triangle, []));

    public static ModelReading Read(
        string text, Func<TriangleRequest, (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics)> triangles) =>
        ModelReader.Read(
            FileName,
            text,
            name => name.EndsWith(".csv", StringComparison.Ordinal) ? new DataFile(name, [1, 2, 3]) : null,
            Forms,
            triangles);

    /// <summary>The model, which must have no error.</summary>
    public static Model Accepted(string text)
    {
        ModelReading reading = Read(text);
        Assert.True(reading.Model is not null, string.Join('\n', reading.Diagnostics));
        return reading.Model;
    }

    /// <summary>Errors and warnings as lines.</summary>
    public static string[] Told(string text) => [.. Read(text).Diagnostics.Select(d => d.ToString())];
}
