namespace Swarm.Engine.Reserving;

/// <summary>The lower triangular root L of a positive definite matrix A = L L'.</summary>
internal sealed class CholeskyFactor
{
    private readonly double[][] _lower;

    public CholeskyFactor(double[][] matrix)
    {
        _lower = new double[matrix.Length][];
        for (int i = 0; i < matrix.Length; i++)
        {
            _lower[i] = new double[i + 1];
            for (int j = 0; j <= i; j++)
            {
                double rest = matrix[i][j];
                for (int k = 0; k < j; k++)
                {
                    rest -= _lower[i][k] * _lower[j][k];
                }

                _lower[i][j] = i == j ? Math.Sqrt(rest) : rest / _lower[j][j];
            }
        }
    }

    /// <summary>v' A^-1 v: the squared length of the solution z of L z = v.</summary>
    public double QuadraticForm(double[] vector)
    {
        double[] solution = new double[vector.Length];
        double sum = 0;
        for (int i = 0; i < vector.Length; i++)
        {
            double rest = vector[i];
            for (int k = 0; k < i; k++)
            {
                rest -= _lower[i][k] * solution[k];
            }

            solution[i] = rest / _lower[i][i];
            sum += solution[i] * solution[i];
        }

        return sum;
    }
}
