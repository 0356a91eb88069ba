using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;
using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Groups of so many columns that panels, blocked Cholesky and bisection do the work.</summary>
public sealed class LargeGroupTests
{
    public static TheoryData<int> Orders => [64, 65, 71, 96, 130];

    /// <summary>Source: Cholesky of MathNet.Numerics.</summary>
    [Theory]
    [MemberData(nameof(Orders))]
    public void Form_is_that_of_a_general_library(int q)
    {
        var (v, u) = (Positive(q, 1e-6), Numbers(q, 2));
        var expected = Vector<double>.Build.Dense(u).DotProduct(v.Cholesky().Solve(Vector<double>.Build.Dense(u)));
        Assert.Equal(1, Quadratic.Form(u, v.ToArray())!.Value / expected, 1e-9);
    }

    [Theory]
    [MemberData(nameof(Orders))]
    public void A_singular_matrix_has_no_form(int q)
    {
        // The last row repeats an earlier one; the others are far from combinations of one another.
        var rows = Matrix<double>.Build.Dense(q, 3 * q, Numbers(3 * q * q, 3));
        rows.SetRow(q - 1, rows.Row(q / 2));
        Assert.Null(Quadratic.Form(Numbers(q, 2), (rows * rows.Transpose()).ToArray()));
    }

    /// <summary>Source: symmetric eigenvalues of MathNet.Numerics.</summary>
    [Theory]
    [MemberData(nameof(Orders))]
    public void Ends_of_the_spectrum_are_those_of_a_general_library(int q)
    {
        var v = Positive(q, 1e-3);
        var expected = v.Evd(Symmetricity.Symmetric).EigenValues.Select(value => value.Real).ToArray();
        var (least, greatest) = Quadratic.EigenvalueRange(v.ToArray());
        Assert.Equal(expected.Min(), least, 1e-12 * expected.Max());
        Assert.Equal(expected.Max(), greatest, 1e-12 * expected.Max());
    }

    /// <summary>Source: second differences of q points have the eigenvalues 2 - 2 cos(k pi / (q + 1)); mirrored rows and columns of another matrix hide the tridiagonal form.</summary>
    [Theory]
    [MemberData(nameof(Orders))]
    public void Ends_of_a_known_spectrum(int q)
    {
        var differences = Matrix<double>.Build.Dense(q, q, (i, j) => i == j ? 2 : Math.Abs(i - j) == 1 ? -1 : 0);
        var mirror = Vector<double>.Build.Dense(Numbers(q, 5)).Normalize(2);
        var reflection = Matrix<double>.Build.DenseIdentity(q) - (2 * mirror.OuterProduct(mirror));
        var (least, greatest) = Quadratic.EigenvalueRange((reflection * differences * reflection).ToArray());
        Assert.Equal(2 - (2 * Math.Cos(Math.PI / (q + 1))), least, 1e-13);
        Assert.Equal(2 - (2 * Math.Cos(q * Math.PI / (q + 1))), greatest, 1e-13);
    }

    [Fact]
    public void Ends_of_a_diagonal_matrix() =>
        Assert.Equal((1, 80), Quadratic.EigenvalueRange(Matrix<double>.Build.Diagonal(80, 80, i => 80 - i).ToArray()));

    /// <summary>Source: the sums over the rows, one by one, of an orthonormal basis that MathNet.Numerics computes; u'V^-1 u does not depend on the basis.</summary>
    [Theory]
    [InlineData(7)]
    [InlineData(8)]
    [InlineData(67)]
    [InlineData(70)]
    public void Robust_tests_are_those_of_sums_row_by_row(int q)
    {
        const int N = 310;
        double[][] z = [.. Enumerable.Range(0, q).Select(c => Numbers(N, 100 + c))];
        var (x, y) = (Numbers(N, 1), Numbers(N, 2));
        var design = new MatrixDesign(true, [x], [z], y, blockRows: 90);
        var analysis = new GroupAnalysis(design);

        var final = Matrix<double>.Build.DenseOfColumnArrays(Enumerable.Repeat(1.0, N).ToArray(), x);
        var all = Matrix<double>.Build.DenseOfColumnArrays([Enumerable.Repeat(1.0, N).ToArray(), x, .. z]);
        var basis = all.QR(MathNet.Numerics.LinearAlgebra.Factorization.QRMethod.Thin).Q;
        var (qz, response) = (basis.SubMatrix(0, N, 2, q), Vector<double>.Build.Dense(y));
        var u = qz.TransposeThisAndMultiply(response);
        var residual = response - (basis * basis.TransposeThisAndMultiply(response));
        var qf = basis.SubMatrix(0, N, 0, 2);
        var restricted = response - (qf * qf.TransposeThisAndMultiply(response));
        Assert.Equal(2, final.ColumnCount);
        double Complement(int i) => 1 - basis.Row(i).DotProduct(basis.Row(i));
        void Check(double[,] sums, Func<int, double> omega)
        {
            var v = qz.TransposeThisAndMultiply(Matrix<double>.Build.DiagonalOfDiagonalArray([.. Enumerable.Range(0, N).Select(omega)]) * qz);
            var expected = u.DotProduct(v.Cholesky().Solve(u));
            Assert.Equal(1, Quadratic.Form(analysis.Groups[0].U, sums)!.Value / expected, 1e-8);
        }

        Check(analysis.Sums(0).Hc0, i => residual[i] * residual[i]);
        Check(analysis.Sums(0).Hc2, i => residual[i] * residual[i] / Complement(i));
        Check(analysis.Sums(0).Hc3, i => Math.Pow(residual[i] / Complement(i), 2));
        Check(analysis.Sums(0).Score, i => restricted[i] * restricted[i]);
    }

    [Fact]
    public void Threads_change_no_bit()
    {
        var design = new MatrixDesign(true, [Numbers(200, 1)], [[.. Enumerable.Range(0, 66).Select(c => Numbers(200, 9 + c))]], Numbers(200, 2), blockRows: 90);
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        AddedGroup[] groups = [AddedGroup.Of(final, [.. design.Layout.Groups[0].Indices])];
        var (one, three) = (RowPass.Run(design, final, groups, []), RowPass.Run(design, final, groups, [], threads: 3));
        Assert.Equal(one.Groups[0].Hc3.Cast<double>(), three.Groups[0].Hc3.Cast<double>());
        Assert.Equal(one.Groups[0].Ceiling.Cast<double>(), three.Groups[0].Ceiling.Cast<double>());
    }

    private static Matrix<double> Positive(int q, double least)
    {
        var basis = Matrix<double>.Build.Dense(q, q, Numbers(q * q, q)).QR().Q;
        return basis * Matrix<double>.Build.Diagonal(q, q, i => Math.Pow(least, (double)i / (q - 1))) * basis.Transpose();
    }

    private static double[] Numbers(int count, int seed)
    {
        var random = new Generator((ulong)seed);
        return [.. Enumerable.Range(0, count).Select(_ => (2 * random.Uniform()) - 1)];
    }
}
