namespace Swarm.Engine.Reserving;

/// <summary>
/// The log-linear predictor of the over-dispersed Poisson model: one level an origin and one a development, the first development's
/// being 0. Origins and developments without amounts have none.
/// </summary>
internal sealed class OdpDesign
{
    private const int None = -1;

    private readonly int[] _originColumn;
    private readonly int[] _developmentColumn;

    public OdpDesign(OdpFit fit)
    {
        Triangle triangle = fit.Triangle;
        int size = 0;
        _originColumn = new int[triangle.Origins.Count];
        for (int i = 0; i < _originColumn.Length; i++)
        {
            _originColumn[i] = fit.Mean(i, 0) > 0 ? size++ : None;
        }

        _developmentColumn = new int[triangle.Developments];
        _developmentColumn[0] = None;
        for (int j = 1; j < _developmentColumn.Length; j++)
        {
            _developmentColumn[j] = fit.ChainLadder.Factors[j - 1] > 1 ? size++ : None;
        }

        Size = size;
        Covariance = new CholeskyFactor(InformationOf(fit));
    }

    /// <summary>Number of levels.</summary>
    public int Size { get; }

    /// <summary>The information matrix of the levels for a scale of 1, factored.</summary>
    public CholeskyFactor Covariance { get; }

    /// <summary>Adds a cell's mean to the entries of its two levels.</summary>
    public void Add(int origin, int development, double mean, double[] vector)
    {
        if (mean == 0)
        {
            return;
        }

        vector[_originColumn[origin]] += mean;
        if (_developmentColumn[development] != None)
        {
            vector[_developmentColumn[development]] += mean;
        }
    }

    private double[][] InformationOf(OdpFit fit)
    {
        double[][] matrix = [.. Enumerable.Range(0, Size).Select(_ => new double[Size])];
        for (int i = 0; i < _originColumn.Length; i++)
        {
            for (int j = 0; j < fit.Triangle.Known(i); j++)
            {
                double mean = fit.Mean(i, j);
                int row = _originColumn[i];
                int column = _developmentColumn[j];
                if (mean == 0)
                {
                    continue;
                }

                matrix[row][row] += mean;
                if (column != None)
                {
                    matrix[column][column] += mean;
                    matrix[row][column] += mean;
                    matrix[column][row] += mean;
                }
            }
        }

        return matrix;
    }
}
