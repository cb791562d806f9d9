namespace ProbeCal;

/// <summary>
/// Solves A·b ≈ y by Householder reflections (G. H. Golub, Numer. Math. 7 (1965) 206–216). Columns are brought to length 1 first, so that
/// units do not decide what counts as small.
/// </summary>
internal static class Householder
{
    /// <summary>A column of which less than this is left beside the others adds nothing that the points could tell.</summary>
    private const double Independent = 1e-12;

    /// <summary>Solves and gives back what variances are made of.</summary>
    /// <param name="matrix">A, row by row; overwritten.</param>
    /// <param name="columns">Number of unknowns, from 1 to the number of rows.</param>
    /// <param name="right">y; overwritten.</param>
    /// <param name="solution">b.</param>
    /// <param name="root">A matrix K, row by row, with K·Kᵀ = (Aᵀ·A)⁻¹.</param>
    /// <returns>False when a column is zero or a combination of others, or a number overflows.</returns>
    internal static bool Solve(double[] matrix, int columns, double[] right, out double[] solution, out double[] root)
    {
        int rows = right.Length;
        solution = new double[columns];
        root = new double[columns * columns];
        double[] diagonal = new double[columns];
        double[] lengths = new double[columns];
        for (int k = 0; k < columns; k++)
        {
            double length = Length(matrix, columns, k, 0, rows);
            if (!(0.0 < length) || double.IsInfinity(length)) { return false; }
            lengths[k] = length;
            for (int i = 0; i < rows; i++) { matrix[(i * columns) + k] /= length; }
        }

        for (int k = 0; k < columns; k++)
        {
            double left = Length(matrix, columns, k, k, rows);
            if (!(Independent < left)) { return false; }
            int at = (k * columns) + k;
            double alpha = matrix[at] < 0.0 ? left : -left;
            matrix[at] -= alpha;
            diagonal[k] = alpha;
            // v·v/2 = left·(left + |a|): no term of it cancels.
            double half = -alpha * matrix[at];
            for (int j = k + 1; j < columns; j++)
            {
                double sum = 0.0;
                for (int i = k; i < rows; i++) { sum += matrix[(i * columns) + k] * matrix[(i * columns) + j]; }
                double factor = sum / half;
                for (int i = k; i < rows; i++) { matrix[(i * columns) + j] -= factor * matrix[(i * columns) + k]; }
            }

            double along = 0.0;
            for (int i = k; i < rows; i++) { along += matrix[(i * columns) + k] * right[i]; }
            double share = along / half;
            for (int i = k; i < rows; i++) { right[i] -= share * matrix[(i * columns) + k]; }
        }

        for (int k = columns - 1; 0 <= k; k--)
        {
            double sum = right[k];
            for (int j = k + 1; j < columns; j++) { sum -= matrix[(k * columns) + j] * solution[j]; }
            solution[k] = sum / diagonal[k];
        }

        Invert(matrix, columns, diagonal, root);
        for (int k = 0; k < columns; k++)
        {
            solution[k] /= lengths[k];
            if (InputCheck.NotFinite(solution[k])) { return false; }
            for (int j = 0; j < columns; j++) { root[(k * columns) + j] /= lengths[k]; }
        }

        return true;
    }

    /// <summary>The inverse of the triangle R, above and on its diagonal.</summary>
    private static void Invert(double[] matrix, int columns, double[] diagonal, double[] inverse)
    {
        for (int j = 0; j < columns; j++)
        {
            inverse[(j * columns) + j] = 1.0 / diagonal[j];
            for (int i = j - 1; 0 <= i; i--)
            {
                double sum = 0.0;
                for (int k = i + 1; k <= j; k++) { sum += matrix[(i * columns) + k] * inverse[(k * columns) + j]; }
                inverse[(i * columns) + j] = -sum / diagonal[i];
            }
        }
    }

    private static double Length(double[] matrix, int columns, int column, int from, int rows)
    {
        double largest = 0.0;
        for (int i = from; i < rows; i++)
        {
            double value = FitCheck.Size(matrix[(i * columns) + column]);
            if (largest < value) { largest = value; }
        }

        if (largest == 0.0) { return 0.0; }
        double sum = 0.0;
        for (int i = from; i < rows; i++)
        {
            double value = matrix[(i * columns) + column] / largest;
            sum += value * value;
        }

        return largest * Numerics.Sqrt(sum);
    }
}
