namespace FiberScope.Imaging.Edges;

/// <summary>Small symmetric systems of equations, solved in place without allocation of a matrix type.</summary>
internal static class SmallSystem
{
    /// <summary>Solves by Cholesky; only the lower triangle is read. Rows without content give zero.</summary>
    public static double[] Solve(double[,] matrix, double[] right, int size)
    {
        for (var j = 0; j < size; j++)
        {
            for (var k = 0; k < j; k++)
            {
                matrix[j, j] -= matrix[j, k] * matrix[j, k];
            }

            matrix[j, j] = Math.Sqrt(Math.Max(matrix[j, j], 1e-12));
            for (var i = j + 1; i < size; i++)
            {
                for (var k = 0; k < j; k++)
                {
                    matrix[i, j] -= matrix[i, k] * matrix[j, k];
                }

                matrix[i, j] /= matrix[j, j];
            }
        }

        var x = (double[])right.Clone();
        for (var i = 0; i < size; i++)
        {
            for (var k = 0; k < i; k++)
            {
                x[i] -= matrix[i, k] * x[k];
            }

            x[i] /= matrix[i, i];
        }

        for (var i = size - 1; i >= 0; i--)
        {
            for (var k = i + 1; k < size; k++)
            {
                x[i] -= matrix[k, i] * x[k];
            }

            x[i] /= matrix[i, i];
        }

        return x;
    }
}
