namespace Swarm.Engine.Reserving;

/// <summary>How a triangle becomes a distribution of unpaid claims.</summary>
public sealed record ReservingOptions
{
    /// <summary>The stochastic method.</summary>
    public ReservingMethod Method { get; init; } = ReservingMethod.OdpBootstrap;

    /// <summary>Distribution of the process error.</summary>
    public ProcessError Process { get; init; } = ProcessError.Gamma;

    /// <summary>How link ratios are averaged.</summary>
    public LinkRatioAverage Average { get; init; } = LinkRatioAverage.VolumeWeighted;

    /// <summary>Number of latest calendar periods whose link ratios count, or null for all.</summary>
    public int? LastPeriods { get; init; }

    /// <summary>Link ratios left out: (origin, development from 0) of the ratio's first cell.</summary>
    public IReadOnlyList<(int Origin, int Development)> Excluded { get; init; } = [];

    /// <summary>Tail beyond the triangle, or null for none.</summary>
    public TailOptions? Tail { get; init; }

    /// <summary>Scale parameter of the over-dispersed Poisson model.</summary>
    public ScaleForm Scale { get; init; } = ScaleForm.Constant;

    /// <summary>True to resample the residuals that are zero by construction, too.</summary>
    public bool KeepZeroResiduals { get; init; } = true;

    /// <summary>True to subtract the residuals' mean before resampling.</summary>
    public bool CentreResiduals { get; init; }

    /// <summary>A booked best estimate that the distribution is moved to, or null.</summary>
    public BookedEstimate? Booked { get; init; }
}

/// <summary>Stochastic reserving methods.</summary>
public enum ReservingMethod
{
    /// <summary>Residual bootstrap of the over-dispersed Poisson model (England &amp; Verrall 1999, 2002).</summary>
    OdpBootstrap,

    /// <summary>Simulation of Mack's model (Mack 1993, 1999).</summary>
    Mack,
}

/// <summary>Distributions of the process error.</summary>
public enum ProcessError
{
    /// <summary>Gamma with the model's mean and variance.</summary>
    Gamma,

    /// <summary>Over-dispersed Poisson: the scale times a Poisson count.</summary>
    OverDispersedPoisson,

    /// <summary>Lognormal with the model's mean and variance (Mack only).</summary>
    Lognormal,
}

/// <summary>Averages of link ratios.</summary>
public enum LinkRatioAverage
{
    /// <summary>Weighted by the first cell's cumulative amount.</summary>
    VolumeWeighted,

    /// <summary>Arithmetic mean.</summary>
    Simple,
}

/// <summary>Forms of the scale parameter.</summary>
public enum ScaleForm
{
    /// <summary>One for all cells.</summary>
    Constant,

    /// <summary>One per development period, pooled where one residual is left.</summary>
    ByDevelopment,
}

/// <summary>Development beyond the triangle.</summary>
public sealed record TailOptions
{
    /// <summary>Factor from the last development period to ultimate, or null to fit an exponential decay.</summary>
    public double? Factor { get; init; }

    /// <summary>Standard deviation of the factor.</summary>
    public double Sd { get; init; }

    /// <summary>Number of development periods after the triangle in which the tail is paid.</summary>
    public int Periods { get; init; } = 1;
}

/// <summary>A booked best estimate.</summary>
/// <param name="BestEstimate">The amount, in the triangle's unit.</param>
/// <param name="Form">How the distribution is moved to it.</param>
public sealed record BookedEstimate(double BestEstimate, BookedForm Form);

/// <summary>Ways to move a distribution to a booked estimate.</summary>
public enum BookedForm
{
    /// <summary>Every amount is multiplied by booked over mean.</summary>
    Scaling,

    /// <summary>Booked less mean is added to every trial, spread over cells in proportion to their means.</summary>
    Shift,
}
