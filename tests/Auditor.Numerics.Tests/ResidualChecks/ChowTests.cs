using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Against fits of the parts (Chow 1960, equations for both forms; no other source); splits in full against R in Auditor.Tests.</summary>
public sealed class ChowTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + Math.Sin(i * 1.7) + (0.2 * Math.Cos(i * i)))];

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(17)]
    [InlineData(38)]
    [InlineData(39)]
    public void Both_forms_compare_the_pooled_fit_with_those_of_the_parts(int first)
    {
        var check = Statistic(Chow.Of(Fit([X], Y), [.. X.Select((_, i) => i >= first)]));
        var pooled = Rss(X, Y);
        var parts = Rss(X[..first], Y[..first]) + Rss(X[first..], Y[first..]);
        var shorter = Math.Min(first, 40 - first);
        var (df1, df2) = (Math.Min(2, shorter), 40 - 2 - Math.Min(2, shorter));
        Assert.Equal((df1, df2), (check.Df!.Value, check.Df2!.Value));
        VectorFile.Near((pooled - parts) / df1 / (parts / df2), check.Statistic, 1e-9);
        VectorFile.Near((pooled - parts) / pooled, check.Sizes.Single().Value, 1e-9);
        Assert.Equal(shorter <= 2, check.Predictive);
    }

    /// <summary>A step at the split is constant in each part: it leaves the intercept nothing to add.</summary>
    [Fact]
    public void A_column_that_only_separates_the_parts_counts_once()
    {
        double[] step = [.. X.Select((_, i) => i >= 20 ? 1.0 : 0)];
        var check = Statistic(Chow.Of(Fit([X, step], Y), [.. step.Select(value => value > 0)]));
        Assert.Equal((1, 36), (check.Df!.Value, check.Df2!.Value));
    }

    [Fact]
    public void A_part_without_rows_is_no_part()
    {
        Assert.Equal(CheckImpediment.EmptyPart, Why(Chow.Of(Fit([X], Y), new bool[40])));
        Assert.Equal(CheckImpediment.EmptyPart, Why(Chow.Of(Fit([X], Y), [.. X.Select(_ => true)])));
    }

    [Fact]
    public void Parts_that_leave_no_degrees_of_freedom_are_too_few_rows() =>
        Assert.Equal(CheckImpediment.TooFew, Why(Chow.Of(Fit([[1, 2, 4, 3]], [1, 5, 2, 2]), [false, false, true, true])));

    private static double Rss(double[] x, double[] y) => y.Length < 3 ? 0 : Fit([x], y).Fit.Rss;
}
