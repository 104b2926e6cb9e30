namespace Swarm.Engine.Summaries;

/// <summary>Why a figure has no error.</summary>
internal static class FigureReasons
{
    public const string NoSpread = "no spread";
    public const string FewTrials = "fewer than 1,000 trials";
    public const string FewTailTrials = "tail holds fewer than 10 trials";
    public const string NoBatchSpread = "no spread between batches";
    public const string Range = "moments exceed the range of a double";

    public static string FewBatches(int batches) => $"fewer than 20 whole batches ({batches})";
}
