namespace Swarm.Engine.Reserving;

/// <summary>Scaled residuals of one origin, development or calendar period.</summary>
/// <param name="Label">The period.</param>
/// <param name="Count">How many there are.</param>
/// <param name="Mean">Their mean; near 0 where the model fits.</param>
/// <param name="MeanSquare">Their mean square; near (n - p) / n, somewhat under 1, where the model fits.</param>
public sealed record ResidualGroup(string Label, int Count, double Mean, double MeanSquare)
{
    internal static ResidualGroup Of(string label, IEnumerable<Residual> residuals)
    {
        int count = 0;
        double sum = 0;
        double squares = 0;
        foreach (Residual residual in residuals)
        {
            count++;
            sum += residual.Scaled;
            squares += residual.Scaled * residual.Scaled;
        }

        return new ResidualGroup(label, count, sum / count, squares / count);
    }
}
