using System.CommandLine.Parsing;
using System.Globalization;

namespace Swarm.Cli.Commands;

/// <summary>Whole numbers on the command line, with underscores between digits as in models.</summary>
internal static class NumberArguments
{
    /// <summary>A whole number within bounds; otherwise the result carries an error that says what would be right.</summary>
    public static long Whole(ArgumentResult result, long least, long most)
    {
        var text = result.Tokens.Single().Value;
        if (TryParse(text, out var value) && value <= (UInt128)most && value >= (UInt128)least) return (long)value;
        result.AddError($"{OptionOf(result)} takes a whole number from {least} to {most:N0}, such as 1_000_000; '{text}' is none");
        return least;
    }

    /// <summary>A seed: any whole number of 64 bits.</summary>
    public static ulong Seed(ArgumentResult result)
    {
        var text = result.Tokens.Single().Value;
        if (TryParse(text, out var value) && value <= ulong.MaxValue) return (ulong)value;
        result.AddError($"{OptionOf(result)} takes a whole number from 0 to {ulong.MaxValue:N0}; '{text}' is none");
        return 0;
    }

    private static bool TryParse(string text, out UInt128 value)
    {
        value = 0;
        var digits = text.Replace("_", "", StringComparison.Ordinal);
        return !text.StartsWith('_') && !text.EndsWith('_') && !text.Contains("__", StringComparison.Ordinal)
            && UInt128.TryParse(digits, NumberStyles.None, CultureInfo.InvariantCulture, out value);
    }

    private static string OptionOf(ArgumentResult result) => (result.Parent as OptionResult)?.Option.Name ?? "the option";
}
