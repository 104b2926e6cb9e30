namespace Swarm.Engine.Reserving.Simulation;

/// <summary>
/// What a pseudo-triangle is made of. A cell's pseudo increment is its mean plus its spread times a residual of the pool. Cells
/// are in order of development, then origin.
/// </summary>
/// <param name="Shape">The triangle's shape.</param>
/// <param name="Means">Fitted increment of each known cell.</param>
/// <param name="Spreads">What a residual is multiplied by in each known cell.</param>
/// <param name="Pool">Residuals, each as likely as the other.</param>
/// <param name="Weights">Weight (0 or 1) of the link ratio that ends in each known cell; unused at development 0.</param>
/// <param name="Average">How link ratios are averaged.</param>
internal sealed record PseudoTriangleInput(
    RunOffShape Shape, double[] Means, double[] Spreads, double[] Pool, double[] Weights, LinkRatioAverage Average)
{
    /// <summary>Number of the first known cell of a development.</summary>
    public int FirstCell(int development) => Shape.RowsAt.Take(development).Sum();
}
