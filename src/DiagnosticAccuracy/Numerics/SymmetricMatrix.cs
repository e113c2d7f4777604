using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace DiagnosticAccuracy.Numerics;

/// <summary>Quadratic forms in the generalised inverse of a covariance matrix.</summary>
internal static class SymmetricMatrix
{
    // Eigenvalues below this share of the largest are taken as zero: rounding leaves about 1e-16 times the dimension.
    private const double Zero = 1e-11;

    /// <summary>x' S+ x with the Moore-Penrose inverse, the rank of S, and whether x lies in the range of S.</summary>
    /// <param name="matrix">S, symmetric, row by row.</param>
    /// <param name="vector">x.</param>
    public static InverseForm InverseForm(double[][] matrix, double[] vector)
    {
        Evd<double> eigen = Matrix<double>.Build.DenseOfRowArrays(matrix).Evd(Symmetricity.Symmetric);
        Vector<double> x = Vector<double>.Build.DenseOfArray(vector);
        double largest = 0;
        for (int i = 0; i < vector.Length; i++)
        {
            largest = Math.Max(largest, eigen.EigenValues[i].Real);
        }

        int rank = 0;
        double value = 0;
        double outside = 0;
        for (int i = 0; i < vector.Length; i++)
        {
            double eigenvalue = eigen.EigenValues[i].Real;
            double along = eigen.EigenVectors.Column(i).DotProduct(x);
            if (largest > 0 && eigenvalue > Zero * largest)
            {
                rank++;
                value += along * along / eigenvalue;
            }
            else
            {
                outside += along * along;
            }
        }

        return new InverseForm(value, rank, Math.Sqrt(outside) <= 1e-9 * Math.Max(1e-300, x.L2Norm()));
    }
}

/// <summary>A quadratic form in a generalised inverse.</summary>
/// <param name="Value">The form.</param>
/// <param name="Rank">The rank of the matrix: the degrees of freedom of the form.</param>
/// <param name="InRange">Whether the vector lies in the range of the matrix; outside of it the form says nothing about the rest.</param>
internal readonly record struct InverseForm(double Value, int Rank, bool InRange);
