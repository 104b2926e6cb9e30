namespace Swarm.Engine.Reserving;

/// <summary>The residual of one known cell.</summary>
/// <param name="Origin">Origin, from 0.</param>
/// <param name="Development">Development, from 0.</param>
/// <param name="Observed">The amount.</param>
/// <param name="Fitted">The model's mean of it.</param>
/// <param name="Pearson">Unscaled Pearson residual: the difference over the root of the variance function; 0 where that is 0.</param>
/// <param name="Scaled">The Pearson residual over the root of the scale.</param>
/// <param name="IsCounted">False where the link ratio into the cell does not count, or the fitted mean is 0.</param>
/// <param name="IsZeroByConstruction">True where the model has a parameter for this cell alone.</param>
public sealed record Residual(
    int Origin,
    int Development,
    double Observed,
    double Fitted,
    double Pearson,
    double Scaled,
    bool IsCounted,
    bool IsZeroByConstruction)
{
    /// <summary>Calendar period of the cell, from 0 for the oldest origin's first cell.</summary>
    public int Calendar => Origin + Development;
}
