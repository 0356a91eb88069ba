using Auditor.Numerics.GroupTests;
using Auditor.Numerics.Random;
using MathNet.Numerics.LinearAlgebra;

namespace Auditor.Numerics.Tests.GroupTests;

/// <summary>Forms over clusters and periods that no package computes, against n x n matrices; weighted rows, and rows written out as often as they have copies.</summary>
public sealed class BruteForceTests
{
    private static readonly DependentRows Rows = new(70, 13, 20);

    [Theory]
    [InlineData(false, false)]
    [InlineData(true, false)]
    [InlineData(false, true)]
    public void Score_form_over_clusters_and_its_ceiling(bool weighted, bool copied)
    {
        var (matrices, cluster, _) = Rows.Expanded(weighted, copied);
        var analysis = Rows.Analyse(weighted: weighted, copied: copied);
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0).Cluster!);
        VectorFile.Near(matrices.Phi(cluster), ClusterF.Phi(group, sums));
        var scores = matrices.Sums(cluster, matrices.ResidualFinal);
        VectorFile.Near(Hotelling(matrices.Phi(cluster) * matrices.Form(scores.TransposeThisAndMultiply(scores)), 13), Statistic(ClusterF.Of(group, sums)));
        var fitted = matrices.Sums(cluster, matrices.Qz * matrices.U);
        VectorFile.Near(Hotelling(matrices.Phi(cluster) * matrices.Form(fitted.TransposeThisAndMultiply(fitted)), 13), Statistic(ClusterF.Ceiling(group, sums)));
    }

    [Theory]
    [InlineData(false, false)]
    [InlineData(true, false)]
    [InlineData(false, true)]
    public void Forms_over_periods(bool weighted, bool copied)
    {
        var (matrices, _, period) = Rows.Expanded(weighted, copied);
        var analysis = Rows.Analyse(weighted: weighted, copied: copied);
        var (group, sums) = (analysis.Groups[0], analysis.Sums(0).Period!);
        const int Nu = 2;
        Assert.Equal(Nu, PeriodF.CosineCount(20));
        Matrix<double> Variance(Vector<double> e)
        {
            var l = BruteForce.Cosines(Nu, 20) * matrices.Sums(period, e);
            return l.TransposeThisAndMultiply(l) * 20 / Nu;
        }

        double F(double wald) => (Nu - 1) / (2.0 * Nu) * wald;
        VectorFile.Near(F(matrices.Phi(period) * matrices.Form(Variance(matrices.ResidualFinal))), Statistic(PeriodF.Of(group, sums)));
        VectorFile.Near(F(matrices.Phi(period) * matrices.Form(Variance(matrices.Qz * matrices.U))), Statistic(PeriodF.Ceiling(group, sums)));
        var estimate = PeriodWald.Of(group, sums);
        VectorFile.Near(matrices.Bias(period, Nu), estimate.BiasFactor);
        VectorFile.Near(F(matrices.Bias(period, Nu) * matrices.Form(Variance(matrices.Residual))), Statistic(estimate.Test));
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Effective_number_of_clusters(bool copied)
    {
        var (matrices, cluster, _) = Rows.Expanded(false, copied);
        var analysis = Rows.Analyse(copied: copied);
        var effective = EffectiveClusters.Of(analysis.Groups[0], analysis.Sums(0).Cluster!)!;
        double Number(Func<IEnumerable<int>, double> gamma)
        {
            var shares = Enumerable.Range(0, 13).Select(c => gamma(Enumerable.Range(0, cluster.Length).Where(i => cluster[i] == c))).ToArray();
            var mean = shares.Average();
            return 13 / (1 + shares.Average(value => Math.Pow((value - mean) / mean, 2)));
        }

        VectorFile.Near(Number(rows => rows.Sum(i => matrices.Qz.Row(i).DotProduct(matrices.Qz.Row(i)))), effective.Uncorrelated);
        VectorFile.Near(
            Number(rows => Math.Pow(rows.Aggregate(Vector<double>.Build.Dense(2), (sum, i) => sum + matrices.Qz.Row(i)).L2Norm(), 2)),
            effective.Correlated);
    }

    /// <summary>Every one of the 2^12 patterns of 13 clusters refitted from the rows.</summary>
    [Fact]
    public void Wild_bootstrap_tries_all_patterns()
    {
        var analysis = Rows.Analyse();
        var test = Assert.IsType<ResampledTest>(WildBootstrap.Of(analysis.Groups[0], analysis.Sums(0).Cluster!, 5000, 0.05, new Generator(1)));
        var observed = Refitted(_ => 1);
        var atLeast = Enumerable.Range(0, 4096).Count(pattern => Refitted(c => c < 12 && ((pattern >> c) & 1) == 1 ? -1 : 1) >= observed * (1 - 1e-9));
        Assert.Equal((atLeast, 4096, true), (test.AtLeast, test.Draws, test.Exhaustive));
        Assert.Equal(atLeast / 4096.0, test.P);
        Assert.InRange(atLeast, 2, 4000);
    }

    /// <summary>The statistic of a draw, whose p the bootstrap counts, is the CR1 statistic but for a constant factor.</summary>
    [Fact]
    public void The_refitted_statistic_is_that_of_CR1()
    {
        var analysis = Rows.Analyse();
        const double Factor = 13.0 / 12 * 69 / 65;
        VectorFile.Near(Refitted(_ => 1) / Factor / 2, Statistic(Cr1.Of(analysis.Groups[0], analysis.Sums(0).Cluster!)));
    }

    /// <summary>Below 12 clusters: the same stream of Webb's six points, each draw refitted from the rows.</summary>
    [Fact]
    public void Wild_bootstrap_with_few_clusters_draws_six_points()
    {
        var rows = new DependentRows(50, 7, 10, 3);
        var analysis = rows.Analyse();
        var test = Assert.IsType<ResampledTest>(WildBootstrap.Of(analysis.Groups[0], analysis.Sums(0).Cluster!, 199, 0.05, new Generator(9, 4)));
        var random = new Generator(9, 4);
        double[] points = [-Math.Sqrt(1.5), -1, -Math.Sqrt(0.5), Math.Sqrt(0.5), 1, Math.Sqrt(1.5)];
        var observed = Refitted(rows, _ => 1);
        var atLeast = 0;
        for (var draw = 0; draw < 199; draw++)
        {
            var factors = Enumerable.Range(0, 7).Select(_ => points[(int)(6 * random.Uniform())]).ToArray();
            atLeast += Refitted(rows, c => factors[c]) >= observed * (1 - 1e-9) ? 1 : 0;
        }

        Assert.Equal((atLeast, 199, false), (test.AtLeast, test.Draws, test.Exhaustive));
        Assert.Equal((atLeast + 1) / 200.0, test.P);
        Assert.InRange(test.Probability, test.Lower, test.Upper);
    }

    private static double Refitted(Func<int, double> factor) => Refitted(Rows, factor);

    /// <summary>u'(sum b_c b_c')^-1 u of the response F b + v_c e(F).</summary>
    private static double Refitted(DependentRows rows, Func<int, double> factor)
    {
        var (matrices, cluster, _) = rows.Expanded(false, false);
        var drawn = rows.Response.Select((y, i) => y - matrices.ResidualFinal[i] + (factor(cluster[i]) * matrices.ResidualFinal[i])).ToArray();
        var constant = Enumerable.Repeat(1.0, drawn.Length).ToArray();
        var refit = new BruteForce([constant, .. rows.Final], rows.Group, drawn);
        var scores = refit.Sums(cluster, refit.Residual);
        return refit.Form(scores.TransposeThisAndMultiply(scores));
    }

    private static double Hotelling(double lm, double c) => (c - 2) / 2 * lm / (c - lm);

    private static double Statistic(TestResult result) => Assert.IsType<FTest>(result).Statistic;
}
