namespace Swarm.Engine.Reserving;

/// <summary>
/// Closed-form prediction errors of the over-dispersed Poisson model (England &amp; Verrall 1999, 2002): a check of the bootstrap,
/// which needs no simulation. Process variance scale times the mean, estimation variance by the delta method from the information
/// matrix.
/// </summary>
public sealed class OdpPredictionErrors
{
    private readonly PredictionError[] _origins;

    private OdpPredictionErrors(OdpFit fit)
    {
        var design = new OdpDesign(fit);
        double scale = fit.Scales[0].Scale;
        var total = new double[design.Size];
        double totalMean = 0;
        _origins = new PredictionError[fit.Triangle.Origins.Count];
        for (int i = 0; i < _origins.Length; i++)
        {
            var gradient = new double[design.Size];
            double mean = 0;
            for (int j = fit.Triangle.Known(i); j < fit.Triangle.Developments; j++)
            {
                double cell = fit.ChainLadder.FutureIncrement(i, j);
                mean += cell;
                design.Add(i, j, cell, gradient);
                design.Add(i, j, cell, total);
            }

            totalMean += mean;
            _origins[i] = PredictionError.OfVariances(scale * mean, scale * design.Covariance.QuadraticForm(gradient));
        }

        Total = PredictionError.OfVariances(scale * totalMean, scale * design.Covariance.QuadraticForm(total));
    }

    /// <summary>Prediction error of the total reserve, in its parts.</summary>
    public PredictionError Total { get; }

    /// <summary>Prediction error of an origin's reserve, in its parts.</summary>
    public PredictionError Origin(int origin) => _origins[origin];

    /// <summary>
    /// The errors, or null where there is no closed form: other averages, excluded link ratios, a scale by development, a tail.
    /// </summary>
    public static OdpPredictionErrors? Of(OdpFit fit) =>
        fit.IsMaximumLikelihood && fit.ChainLadder.Tail is null ? new OdpPredictionErrors(fit) : null;
}
