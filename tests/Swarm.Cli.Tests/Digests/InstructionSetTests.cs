using System.Diagnostics;
using System.Text.Json;

namespace Swarm.Cli.Tests.Digests;

/// <summary>The contract of bits across instruction sets: whole processes with some of them switched off.</summary>
public sealed class InstructionSetTests
{
    private const string Model = """
        model: Larkfell Mutual, two invented triangles in small
        triangles:
          motor:
            data: motor.csv
            amounts: incremental
            method: odp_bootstrap
            tail: {factor: 1.02, sd: 0.01, periods: 2}
          liability:
            data: motor.csv
            amounts: incremental
            method: mack
            process: lognormal
        draws:
          inflation: normal(mean=2%, sd=1%)
          shock: gamma(shape=0.6, scale=10)
        formulas:
          unpaid: (motor.unpaid + liability.unpaid) * exp(3 * inflation) + shock ^ 1.1
        outcomes:
          unpaid: {above: [900]}
          motor.unpaid: {}
          liability.unpaid: {}
        """;

    private const string Data = """
        origin,1,2,3,4
        2022,300,150,60,20
        2023,320,170,50,
        2024,310,160,,
        2025,330,,,
        """;

    private static readonly Lazy<string> Expected = new(() => DigestWith([], "1"));

    [Theory]
    [InlineData("DOTNET_EnableAVX512", "0")]
    [InlineData("DOTNET_EnableAVX2", "0")]
    [InlineData("DOTNET_EnableHWIntrinsic", "0")]
    [InlineData("DOTNET_TieredCompilation", "1")]
    public void A_process_without_some_instructions_gives_the_same_digest(string variable, string value) =>
        Assert.Equal(Expected.Value, DigestWith(new() { [variable] = value }, "2"));

    private static string DigestWith(Dictionary<string, string> environment, string threads)
    {
        string folder = Directory.CreateTempSubdirectory("swarm-digest-").FullName;
        try
        {
            File.WriteAllText(Path.Combine(folder, "model.yaml"), Model);
            File.WriteAllText(Path.Combine(folder, "motor.csv"), Data);
            return Run(folder, environment, threads);
        }
        finally
        {
            Directory.Delete(folder, true);
        }
    }

    private static string Run(string folder, Dictionary<string, string> environment, string threads)
    {
        var start = new ProcessStartInfo("dotnet")
        {
            WorkingDirectory = folder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        string[] arguments =
        [
            Path.Combine(AppContext.BaseDirectory, "swarm.dll"), "run", "model.yaml",
            "--trials", "70_000", "--seed", "20251231", "--threads", threads, "--no-record", "--json",
        ];
        Array.ForEach(arguments, start.ArgumentList.Add);
        foreach ((string name, string value) in environment)
        {
            start.Environment[name] = value;
        }

        using Process process = Process.Start(start)!;
        Task<string> errors = process.StandardError.ReadToEndAsync();
        string output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, errors.Result);
        return JsonDocument.Parse(output).RootElement.GetProperty("digest").GetString()!;
    }
}
