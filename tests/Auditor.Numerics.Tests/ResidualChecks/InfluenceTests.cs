using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Influence from its definition, by deleting rows and refitting (no source); values of other programs are compared in Auditor.Tests.</summary>
public sealed class InfluenceTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + Math.Sin(i * 1.7) + (0.2 * Math.Cos(i * i)))];

    [Fact]
    public void Every_row_is_what_the_fit_without_it_says()
    {
        var all = Fit([X], Y);
        Assert.All(RowInfluence.OfAll(all), row =>
        {
            double[] Without(double[] values) => [.. values.Where((_, i) => i != row.Position)];
            var fit = new GroupAnalysis(new MatrixDesign(true, [Without(X)], [], Without(Y))).Fit;
            double At(Fit of, double x) => of.Coefficients[0] + (of.Coefficients[1] * x);
            var error = fit.Sigma!.Value / Math.Sqrt(1 - row.Leverage);
            Near((Y[row.Position] - At(fit, X[row.Position])) / error, row.StudentisedResidual);
            Near((At(all.Fit, X[row.Position]) - At(fit, X[row.Position])) / (fit.Sigma.Value * Math.Sqrt(row.Leverage)), row.Dffits);
            Near(X.Sum(x => Math.Pow(At(all.Fit, x) - At(fit, x), 2)) / (2 * Math.Pow(all.Fit.Sigma!.Value, 2)), row.CooksDistance);
        });
    }

    [Fact]
    public void The_largest_are_sorted_and_the_outermost_is_found()
    {
        var fit = Fit([X], Y);
        var summary = InfluenceSummary.Of(fit, 10);
        RowInfluence[] rows = [.. RowInfluence.OfAll(fit)];
        Assert.Equal(rows.OrderByDescending(row => row.CooksDistance).Take(10), summary.Largest);
        Assert.Equal(rows.MaxBy(row => Math.Abs(row.StudentisedResidual!.Value)), summary.Outermost);
        Assert.Equal(summary.Outermost!.Value.Position, Statistic(Checks.Largest(fit)).Position);
    }

    [Fact]
    public void Of_equal_distances_the_earlier_row_stands_first() =>
        Assert.Equal([0, 1, 2], InfluenceSummary.Of(Fit([], [1, -1, 1, -1, 1, -1]), 3).Largest.Select(row => row.Position));

    /// <summary>All rows but one lie on a line: nothing could be more out of line, and no finite figure says so.</summary>
    [Fact]
    public void A_row_that_alone_spoils_a_perfect_fit_is_the_outermost()
    {
        double[] line = [.. X.Select((x, i) => 2 + (0.3 * x) + (i == 17 ? 1 : 0))];
        var fit = Fit([X], line);
        var outcome = Assert.IsType<UnboundedCheck>(Checks.Largest(fit));
        Assert.Equal((17, 37), (outcome.Position, outcome.Df));
        var row = InfluenceSummary.Of(fit, 1).Largest.Single();
        Assert.Equal(17, row.Position);
        Assert.Null(row.StudentisedResidual);
        Assert.Null(row.Dffits);
    }

    /// <summary>With one degree of freedom none is left without a row.</summary>
    [Fact]
    public void One_degree_of_freedom_leaves_cooks_distance_alone()
    {
        var fit = Fit([[1, 2, 4]], [1, 5, 2]);
        Assert.All(RowInfluence.OfAll(fit), row =>
        {
            Assert.NotNull(row.CooksDistance);
            Assert.Null(row.StudentisedResidual);
            Assert.False(row.AloneSpoilsTheFit);
        });
        Assert.Equal(CheckImpediment.TooFew, Why(Checks.Largest(fit)));
    }

    private static void Near(double expected, double? actual) => VectorFile.Near(expected, actual, 1e-8);
}
