namespace Swarm.Engine.Summaries;

/// <summary>Figures with their errors, by one of the two ways to them. Called where the figure's moments allow an error at all.</summary>
internal interface IFigureErrors
{
    Estimate Mean();

    Estimate Sd();

    Estimate Skewness();

    Estimate Var(double level);

    Estimate Tvar(double level);

    /// <summary>The probability to exceed the threshold with this position in the request.</summary>
    Estimate Exceedance(int threshold);
}
