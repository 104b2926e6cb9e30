using Swarm.Engine.Summaries;

namespace Swarm.Cli.Output;

/// <summary>All figures of one outcome, a line each: value, error, interval.</summary>
internal sealed class FigureBlock
{
    private readonly TextTable _table = new(
        new TextColumn("", false), new TextColumn("figure"), new TextColumn("± error"), new TextColumn("95 % interval"));
    private readonly List<string> _reasons = [];

    private FigureBlock()
    {
    }

    /// <summary>Writes the block of an outcome, its name apart.</summary>
    /// <param name="output">Where to.</param>
    /// <param name="width">Columns of the page.</param>
    /// <param name="figures">The figures.</param>
    /// <param name="parts">Parameter and process error, or null.</param>
    public static void Write(TextWriter output, int width, OutcomeFigures figures, Engine.Records.ErrorParts? parts)
    {
        var block = new FigureBlock();
        block.Add("mean", figures.Mean);
        block.Add("sd", figures.Sd);
        if (parts is { } split)
        {
            block.Add("  parameter error", split.Parameter);
            block.Add("  process error", split.Process);
        }

        block.Add("skewness", figures.Skewness);
        foreach (var level in figures.Levels) block.Add($"VaR {NumberText.Percent(level.P)}", level.Var);
        foreach (var level in figures.Levels) block.Add($"TVaR {NumberText.Percent(level.P)}", level.Tvar);
        foreach (var above in figures.Above)
            block.Add($"above {NumberText.Short(above.Threshold)}", FigureText.InPercent(above.Probability), above.Probability.Reason);
        block._table.Write(output, width);
        block.WriteReasons(output, width);
        var range = $"{NumberText.Plain(figures.Min)} to {NumberText.Plain(figures.Max)}";
        Paragraph.Write(output, width, range, "  least and greatest trial: ");
    }

    /// <summary>Writes the one figure that an outcome of yes or no has.</summary>
    public static void Write(TextWriter output, int width, Estimate probability)
    {
        var block = new FigureBlock();
        block.Add("probability", FigureText.InPercent(probability), probability.Reason);
        block._table.Write(output, width);
        block.WriteReasons(output, width);
    }

    private void Add(string name, Estimate figure) => Add(name, FigureText.Of(figure), figure.Reason);

    private void Add(string name, FigureText text, string? reason) =>
        _table.Add(name, text.Value, text.Error, reason is null ? text.Interval : $"({Letter(reason)})");

    private char Letter(string reason)
    {
        if (!_reasons.Contains(reason)) _reasons.Add(reason);
        return (char)('a' + _reasons.IndexOf(reason));
    }

    private void WriteReasons(TextWriter output, int width)
    {
        foreach (var reason in _reasons) Paragraph.Write(output, width, $"no error: {reason}", $"  ({Letter(reason)}) ");
    }
}
