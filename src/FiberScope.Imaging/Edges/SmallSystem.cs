namespace FiberScope.Imaging.Edges;

/// <summary>Small symmetric positive systems of equations, solved in place in the caller's memory.</summary>
internal static class SmallSystem
{
    /// <summary>Replaces the lower triangle of a matrix (row by row, size × size) by its Cholesky factor.</summary>
    public static void Factorise(Span<double> matrix, int size)
    {
        for (var j = 0; j < size; j++)
        {
            for (var i = j; i < size; i++)
            {
                var sum = matrix[(i * size) + j];
                for (var k = 0; k < j; k++)
                {
                    sum -= matrix[(i * size) + k] * matrix[(j * size) + k];
                }

                matrix[(i * size) + j] = i == j ? Math.Sqrt(Math.Max(sum, 1e-12)) : sum / matrix[(j * size) + j];
            }
        }
    }

    /// <summary>Replaces the right side by the solution; <paramref name="factor"/> comes from <see cref="Factorise"/>.</summary>
    public static void Solve(ReadOnlySpan<double> factor, Span<double> right, int size)
    {
        HalfSolve(factor, right, size);
        for (var i = size - 1; i >= 0; i--)
        {
            for (var k = i + 1; k < size; k++)
            {
                right[i] -= factor[(k * size) + i] * right[k];
            }

            right[i] /= factor[(i * size) + i];
        }
    }

    /// <summary>cᵀ A⁻¹ c, the variance of a sum of parameters with the coefficients c; c is overwritten.</summary>
    public static double Variance(ReadOnlySpan<double> factor, Span<double> coefficients, int size)
    {
        HalfSolve(factor, coefficients, size);
        var sum = 0.0;
        for (var i = 0; i < size; i++)
        {
            sum += coefficients[i] * coefficients[i];
        }

        return sum;
    }

    private static void HalfSolve(ReadOnlySpan<double> factor, Span<double> right, int size)
    {
        for (var i = 0; i < size; i++)
        {
            for (var k = 0; k < i; k++)
            {
                right[i] -= factor[(i * size) + k] * right[k];
            }

            right[i] /= factor[(i * size) + i];
        }
    }
}
