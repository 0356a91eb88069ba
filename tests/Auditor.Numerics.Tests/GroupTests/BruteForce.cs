using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>The definitions carried out with n x n matrices on expanded and weighted rows, by another library's decompositions.</summary>
internal sealed class BruteForce
{
    private readonly Matrix<double> _qf;
    private readonly Matrix<double> _q;

    /// <param name="final">Columns of F, a constant included when there is one; rows times sqrt(w).</param>
    public BruteForce(double[][] final, double[][] group, double[] response)
    {
        var y = Vector<double>.Build.DenseOfArray(response);
        _qf = Orthonormal(final);
        _q = Orthonormal([.. final, .. group]);
        Qz = _q.SubMatrix(0, N(final), final.Length, group.Length);
        ResidualFinal = y - (_qf * _qf.TransposeThisAndMultiply(y));
        Residual = y - (_q * _q.TransposeThisAndMultiply(y));
        U = Qz.TransposeThisAndMultiply(y);
    }

    public Matrix<double> Qz { get; }

    public Vector<double> U { get; }

    public Vector<double> Residual { get; }

    public Vector<double> ResidualFinal { get; }

    public Matrix<double> ResidualMaker => Matrix<double>.Build.DenseIdentity(_q.RowCount) - (_q * _q.Transpose());

    /// <summary>1 - tr(N)/q.</summary>
    public double Phi(int[] codes)
    {
        var sum = Classes(codes).Sum(rows => Math.Pow((Rows(Qz, rows).Transpose() * Rows(_qf, rows)).FrobeniusNorm(), 2));
        return 1 - (sum / Qz.ColumnCount);
    }

    /// <summary>The sums over each class of qz times e; one row a class.</summary>
    public Matrix<double> Sums(int[] codes, Vector<double> e) => Matrix<double>.Build.DenseOfRowVectors(
        Classes(codes).Select(rows => rows.Aggregate(Vector<double>.Build.Dense(Qz.ColumnCount), (sum, i) => sum + (Qz.Row(i) * e[i]))));

    /// <summary>nu x T, sqrt(2/T) cos(pi j (t - 1/2)/T).</summary>
    public static Matrix<double> Cosines(int nu, int periods) =>
        Matrix<double>.Build.Dense(nu, periods, (j, t) => Math.Sqrt(2.0 / periods) * Math.Cos(Math.PI * (j + 1) * (t + 0.5) / periods));

    public double Form(Matrix<double> v) => U.DotProduct(v.Solve(U));

    /// <summary>(T/(nu q)) sum_a |C diag(qz_a)(I - H)|², C the cosines of each row's period.</summary>
    public double Bias(int[] codes, int nu)
    {
        var periods = codes.Max() + 1;
        var cosines = Cosines(nu, periods);
        var c = Matrix<double>.Build.Dense(nu, codes.Length, (j, i) => cosines[j, codes[i]]);
        var sum = Qz.EnumerateColumns().Sum(column => Math.Pow((c * Matrix<double>.Build.DenseOfDiagonalVector(column) * ResidualMaker).FrobeniusNorm(), 2));
        return periods / ((double)nu * Qz.ColumnCount) * sum;
    }

    private static int N(double[][] columns) => columns[0].Length;

    private static Matrix<double> Orthonormal(double[][] columns) =>
        Matrix<double>.Build.DenseOfColumnArrays(columns).QR(MathNet.Numerics.LinearAlgebra.Factorization.QRMethod.Thin).Q;

    private static IEnumerable<int[]> Classes(int[] codes) =>
        Enumerable.Range(0, codes.Max() + 1).Select(code => Enumerable.Range(0, codes.Length).Where(i => codes[i] == code).ToArray());

    private static Matrix<double> Rows(Matrix<double> matrix, int[] rows) =>
        Matrix<double>.Build.Dense(rows.Length, matrix.ColumnCount, (i, j) => matrix[rows[i], j]);
}
