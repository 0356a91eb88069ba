using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>What has no value says why. Expected outcomes follow from the definitions (no source); values are checked against other programs elsewhere.</summary>
public sealed class EdgeCaseTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + Math.Sin(i * 1.7) + (0.2 * Math.Cos(i * i)))];

    [Fact]
    public void A_perfect_fit_has_nothing_to_check()
    {
        var fit = Fit([X], [.. X.Select(x => 2 + (3 * x))]);
        Assert.All(All(fit), outcome => Assert.Equal(CheckImpediment.NoResiduals, Why(outcome)));
        Assert.False(InfluenceSummary.Of(fit, 10).HasResiduals);
    }

    [Fact]
    public void A_model_without_residual_degrees_of_freedom_has_nothing_to_check() =>
        Assert.All(All(Fit([[1, 2, 4], [0, 1, 0]], [1, 5, 2])), outcome => Assert.Equal(CheckImpediment.NoResiduals, Why(outcome)));

    [Fact]
    public void Sampling_weights_have_no_reference_distribution() =>
        Assert.All(All(Fit([X], Y, weights: X.Select(x => 1 + x).ToArray(), sampling: true)), outcome => Assert.Equal(CheckImpediment.SamplingWeights, Why(outcome)));

    [Fact]
    public void A_model_of_a_constant_has_nothing_to_relate()
    {
        var fit = Fit([], Y);
        Assert.Equal(CheckImpediment.NothingToRelate, Why(BreuschPagan.Studentised(fit)));
        Assert.Equal(CheckImpediment.NothingToRelate, Why(BreuschPagan.Original(fit)));
        Assert.Equal(CheckImpediment.NothingToRelate, Why(White.Of(fit)));
        Assert.Equal(CheckImpediment.NothingToRelate, Why(Reset.Of(fit)));
        Assert.IsType<CheckStatistic>(ShapiroWilk.Of(fit));
    }

    /// <summary>The slope is rounding: a balanced 0/1 column against a response with the same mean in both halves.</summary>
    [Fact]
    public void Constant_fitted_values_have_no_powers() =>
        Assert.Equal(CheckImpediment.NothingToRelate, Why(Reset.Of(Fit([[0, 0, 0, 1, 1, 1]], [0.1, 0.2, 0.6, 0.6, 0.1, 0.2]))));

    /// <summary>Fitted values of a 0/1 column take two values: every power of them is a combination of the column and the intercept.</summary>
    [Fact]
    public void Powers_of_two_fitted_values_add_nothing() =>
        Assert.Equal(CheckImpediment.PowersAddNothing, Why(Reset.Of(Fit([[.. X.Select((_, i) => i % 2.0)]], Y))));

    /// <summary>Three fitted values have a square of their own but no cube beside it.</summary>
    [Fact]
    public void Three_fitted_values_have_one_power_and_no_second() =>
        Assert.Equal(CheckImpediment.PowersAddNothing, Why(Reset.Of(Fit([[.. X.Select((_, i) => i % 3.0)]], Y))));

    [Fact]
    public void Powers_that_make_the_fit_perfect_have_no_finite_statistic()
    {
        var outcome = Assert.IsType<UnboundedCheck>(Reset.Of(Fit([X], [.. X.Select(x => 1 + x + (x * x))])));
        Assert.Equal((2, 36), (outcome.Df, outcome.Df2));
    }

    [Fact]
    public void Residuals_of_one_size_have_no_variance_to_explain()
    {
        double[] half = [.. Enumerable.Range(0, 40).Select(i => (double)(i / 20))];
        var fit = Fit([half], [.. half.Select((x, i) => 0.1 + (0.7 * x) + (i % 2 == 0 ? 0.3 : -0.3))]);
        Assert.Equal(CheckImpediment.EqualSquares, Why(BreuschPagan.Studentised(fit)));
        Assert.Equal(CheckImpediment.EqualSquares, Why(BreuschPagan.Original(fit)));
        Assert.Equal(CheckImpediment.EqualSquares, Why(White.Of(fit)));
        Assert.IsType<CheckStatistic>(AndersonDarling.Of(fit));
    }

    /// <summary>Without an intercept the residuals may all be the same number.</summary>
    [Fact]
    public void Equal_residuals_have_no_distribution()
    {
        var fit = Fit([[1, -1, 1, -1, 1, -1, 1, -1, 1, -1]], [.. Enumerable.Repeat(0.3, 10)], intercept: false);
        Assert.Equal(CheckImpediment.EqualResiduals, Why(JarqueBera.Of(fit, 1)));
        Assert.Equal(CheckImpediment.EqualResiduals, Why(ShapiroWilk.Of(fit)));
        Assert.Equal(CheckImpediment.EqualResiduals, Why(AndersonDarling.Of(fit)));
    }

    [Fact]
    public void An_auxiliary_regression_as_wide_as_the_data_is_no_check()
    {
        double[][] three = [[1, 2, 4, 8, 3, 5, 9, 7], [0, 3, 1, 5, 2, 8, 4, 4], [2, 2, 7, 1, 0, 3, 5, 6]];
        Assert.Equal(CheckImpediment.Saturated, Why(White.Of(Fit(three, [1, 5, 2, 3, 8, 1, 4, 4]))));
        Assert.IsType<CheckStatistic>(BreuschPagan.Studentised(Fit(three, [1, 5, 2, 3, 8, 1, 4, 4])));
    }

    [Fact]
    public void Too_few_and_too_many_rows_are_said()
    {
        Assert.Equal(CheckImpediment.TooFew, Why(AndersonDarling.Of(Fit([], Y[..7]))));
        Assert.IsType<CheckStatistic>(AndersonDarling.Of(Fit([], Y[..8])));
        Assert.Equal(CheckImpediment.TooFew, Why(ShapiroWilk.Of(Fit([], Y[..2]))));
        Assert.Equal(CheckImpediment.TooFew, Why(Checks.Largest(Fit([], Y[..2]))));
        var copies = X.Select(_ => 126.0).ToArray();
        Assert.Equal(CheckImpediment.TooMany, Why(ShapiroWilk.Of(Fit([X], Y, copies: copies))));
        Assert.Equal(CheckImpediment.TooMany, Why(AndersonDarling.Of(Fit([X], Y, copies: [.. copies.Select(c => c * 200)]))));
    }

    /// <summary>A column that repeats others changes no check of the model without it.</summary>
    [Fact]
    public void An_aliased_column_changes_nothing()
    {
        double[] other = [.. X.Select((x, i) => Math.Cos(3 * x) + (i / 9.0))];
        double[] sum = [.. X.Zip(other, (a, b) => (2 * a) - b + 4)];
        Assert.All(
            All(Fit([X, other], Y)).Zip(All(Fit([X, other, sum], Y))),
            pair => VectorFile.Near(Statistic(pair.First).Statistic, Statistic(pair.Second).Statistic, 1e-8));
    }

    /// <summary>A row with its own dummy has residual 0 and leverage 1; it is no candidate for the largest residual and multiplies no p.</summary>
    [Fact]
    public void A_row_with_its_own_dummy()
    {
        double[] dummy = [.. X.Select((_, i) => i == 9 ? 1.0 : 0)];
        var fit = Fit([X, dummy], Y);
        var summary = InfluenceSummary.Of(fit, 50);
        Assert.Equal([9], summary.LeverageOne);
        Assert.Equal(39, summary.Observations);
        Assert.Equal(39, summary.Largest.Count);
        double[] Without(double[] values) => [.. values.Where((_, i) => i != 9)];
        var (with, without) = (Statistic(Checks.Largest(fit)), Statistic(Checks.Largest(Fit([Without(X)], Without(Y)))));
        VectorFile.Near(without.Statistic, with.Statistic, 1e-9);
        VectorFile.Near(without.P, with.P, 1e-9);
        Assert.All(All(fit), outcome => Assert.IsType<CheckStatistic>(outcome));
    }

    [Fact]
    public void Frequency_weights_equal_the_expanded_data()
    {
        double[] copies = [.. X.Select((_, i) => 1 + (i % 3.0))];
        double[] Expanded(double[] values) => [.. values.SelectMany((value, i) => Enumerable.Repeat(value, (int)copies[i]))];
        var pairs = All(Fit([X], Y, copies: copies)).Zip(All(Fit([Expanded(X)], Expanded(Y))));
        Assert.All(pairs, pair =>
        {
            VectorFile.Near(Statistic(pair.Second).Statistic, Statistic(pair.First).Statistic, 1e-9);
            VectorFile.Near(Statistic(pair.Second).P, Statistic(pair.First).P, 1e-8);
            Assert.Equal(Statistic(pair.Second).SimulatedP, Statistic(pair.First).SimulatedP);
        });
    }

    /// <summary>The residuals are those of rows times sqrt(w); the columns that explain their squares are not weighted.</summary>
    [Fact]
    public void Weights_enter_the_residuals_and_not_the_auxiliary_columns()
    {
        double[] weights = [.. X.Select((_, i) => 1 + (i % 4.0))];
        double[] Times(double[] values) => [.. values.Zip(weights, (value, w) => value * Math.Sqrt(w))];
        var weighted = Fit([X], Y, weights: weights);
        var scaled = Fit([Times([.. X.Select(_ => 1.0)]), Times(X)], Times(Y), intercept: false);
        Assert.All(weighted.Store.Residuals.Zip(scaled.Store.Residuals), pair => Assert.Equal(pair.First, pair.Second, 1e-12));
        Assert.Equal(1, Statistic(BreuschPagan.Studentised(weighted)).Df);
        Assert.Equal(2, Statistic(BreuschPagan.Studentised(scaled)).Df);
        VectorFile.Near(SquaresOnColumn(weighted, X), Statistic(BreuschPagan.Studentised(weighted)).Statistic, 1e-10);
        VectorFile.Near(Statistic(ShapiroWilk.Of(scaled)).Statistic, Statistic(ShapiroWilk.Of(weighted)).Statistic, 1e-10);
        VectorFile.Near(Statistic(Checks.Largest(scaled)).Statistic, Statistic(Checks.Largest(weighted)).Statistic, 1e-9);
    }

    /// <summary>n times the squared correlation of the squared residuals with one column: Koenker's statistic for one column.</summary>
    private static double SquaresOnColumn(CheckedFit fit, double[] x)
    {
        double[] u = [.. fit.Store.Residuals.Select(e => e * e)];
        var (mx, mu) = (x.Average(), u.Average());
        var (xu, xx, uu) = (x.Zip(u, (a, b) => (a - mx) * (b - mu)).Sum(), x.Sum(a => (a - mx) * (a - mx)), u.Sum(b => (b - mu) * (b - mu)));
        return x.Length * xu * xu / (xx * uu);
    }
}
