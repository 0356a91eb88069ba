using Auditor.Numerics.Pictures;
using Auditor.Numerics.SecondPass;
using CsCheck;
using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Tests.Pictures;

/// <summary>Against residuals and coefficients of whole regressions by MathNet's QR.</summary>
public class AddedVariableTests
{
    private const double Tolerance = 1e-9;

    [Fact]
    public void OneColumnIsDrawnAsItsResidualWithItsCoefficientAsSlope() => RandomDesign.Any.Sample(data =>
    {
        var picture = Picture(data, [data.Z1]);
        var final = Matrix<double>.Build.DenseOfColumnArrays(Ones(data), data.X);
        var whole = Matrix<double>.Build.DenseOfColumnArrays(Ones(data), data.X, data.Z1);
        Assert.True(picture.OneColumn);
        Assert.Equal(Solve(whole, data.Y)[2], picture.Slope, Tolerance);
        Check(picture, Residuals(final, data.Z1), Residuals(final, data.Y));
    });

    [Fact]
    public void SeveralColumnsAreDrawnAsTheirFittedPart() => RandomDesign.Any.Sample(data =>
    {
        var picture = Picture(data, [data.Z1, data.Z2]);
        var final = Matrix<double>.Build.DenseOfColumnArrays(Ones(data), data.X);
        var whole = Matrix<double>.Build.DenseOfColumnArrays(Ones(data), data.X, data.Z1, data.Z2);
        var without = Residuals(final, data.Y);
        Assert.False(picture.OneColumn);
        Assert.Equal(1, picture.Slope);
        Check(picture, without - Residuals(whole, data.Y), without);
    });

    [Fact]
    public void ResidualsStandAgainstTheDeclaredValues() => RandomDesign.Any.Sample(data =>
    {
        var analysis = new GroupAnalysis(Design(data, [data.Z1]));
        var picture = new ResidualsAgainstColumn(2, 1000);
        RowPass.Run(Design(data, [data.Z1]), analysis.Final, [], [picture]);
        var residuals = Residuals(Matrix<double>.Build.DenseOfColumnArrays(Ones(data), data.X), data.Y);
        Assert.Equal(data.N, picture.Points.Points.Count);
        Assert.All(picture.Points.Points.Select((point, i) => (point, i)), item =>
        {
            Assert.Equal(data.Z1[item.i], item.point.X, Tolerance);
            Assert.Equal(residuals[item.i], item.point.Y, Tolerance);
        });
    });

    private static AddedVariable Picture(RandomDesign data, double[][] group)
    {
        var analysis = new GroupAnalysis(Design(data, group));
        var picture = new AddedVariable(analysis.Groups[0], 1000);
        RowPass.Run(Design(data, group), analysis.Final, [], [picture]);
        return picture;
    }

    private static void Check(AddedVariable picture, Vector<double> across, Vector<double> up)
    {
        Assert.Equal(across.Count, picture.Points.Points.Count);
        Assert.All(picture.Points.Points.Select((point, i) => (point, i)), item =>
        {
            Assert.Equal(across[item.i], item.point.X, Tolerance);
            Assert.Equal(up[item.i], item.point.Y, Tolerance);
        });
    }

    private static MatrixDesign Design(RandomDesign data, double[][] group) => new(true, [data.X], [group], data.Y);

    private static double[] Ones(RandomDesign data) => [.. Enumerable.Repeat(1.0, data.N)];

    private static Vector<double> Solve(Matrix<double> x, double[] y) => x.QR().Solve(Vector<double>.Build.Dense(y));

    private static Vector<double> Residuals(Matrix<double> x, double[] y) => Vector<double>.Build.Dense(y) - (x * Solve(x, y));
}
