using Auditor.Numerics.Factor;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.Tests;

/// <summary>Edges of the residual checks; their values are checked in Auditor.Tests against the reference cases.</summary>
public sealed class ResidualCheckEdgeTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + Math.Sin(i * 1.7) + (0.2 * Math.Cos(i * i)))];

    [Fact]
    public void A_perfect_fit_has_nothing_to_check() =>
        Assert.All(All(Checked([X], [.. X.Select(x => 2 + (3 * x))])), outcome => Assert.Equal(CheckImpediment.NoResiduals, Why(outcome)));

    [Fact]
    public void Sampling_weights_have_no_reference_distribution() =>
        Assert.All(All(Checked([X], Y, sampling: true)), outcome => Assert.Equal(CheckImpediment.SamplingWeights, Why(outcome)));

    [Fact]
    public void Equal_residuals_say_nothing_of_the_errors()
    {
        double[] alternating = [.. Enumerable.Range(0, 40).Select(i => i % 2 == 0 ? 1.0 : -1.0)];
        var design = new MatrixDesign(false, [alternating], [], [.. alternating.Select(_ => 1.0)]);
        Assert.All(All(Checked(design)), outcome => Assert.Equal(CheckImpediment.ResidualsDoNotVary, Why(outcome)));
    }

    [Fact]
    public void A_row_without_which_the_fit_is_perfect_has_no_studentised_residual()
    {
        double[] line = [.. X.Select((x, i) => 2 + (3 * x) + (i == 5 ? 10 : 0))];
        var fit = Checked([X], line);
        Assert.Null(RowInfluence.OfAll(fit)[5].StudentisedResidual);
        Assert.Equal(CheckImpediment.PerfectWithoutOneRow, Why(LargestResidual.Of(fit, RowInfluence.OfAll(fit))));
    }

    [Fact]
    public void A_model_of_a_constant_has_nothing_to_relate()
    {
        var fit = Checked([], Y);
        Assert.Equal(CheckImpediment.NothingToRelate, Why(BreuschPagan.Studentised(fit)));
        Assert.Equal(CheckImpediment.NothingToRelate, Why(White.Of(fit)));
        Assert.Equal(CheckImpediment.NothingToRelate, Why(Reset.Of(fit)));
        Assert.IsType<CheckStatistic>(ShapiroWilk.Of(fit));
    }

    /// <summary>White with one number: the square is the only column added; a 0/1 column adds none.</summary>
    [Fact]
    public void White_leaves_out_what_adds_nothing()
    {
        double[] half = [.. X.Select((_, i) => i % 2.0)];
        double[] other = [.. half.Select(value => 1 - value)];
        Assert.Equal(2, Statistic(White.Of(Checked([X], Y))).Df);
        Assert.Equal(1, Statistic(White.Of(Checked([half], Y))).Df);
        Assert.Equal(4, Statistic(White.Of(Checked([X, half], Y))).Df);
        Assert.Equal(1, Statistic(White.Of(Checked([half, other], Y))).Df);
    }

    [Fact]
    public void White_in_more_than_100_columns_rests_on_the_fitted_value()
    {
        var many = Enumerable.Range(1, 13).Select(c => X.Select((x, i) => Math.Sin((c * x) + i)).ToArray()).ToArray();
        var check = Statistic(White.Of(Checked(many, Y)));
        Assert.True(check.OnFittedValues);
        Assert.Equal(2, check.Df);
    }

    [Fact]
    public void Frequency_weights_equal_the_expanded_data()
    {
        double[] copies = [.. X.Select((_, i) => 1 + (i % 3.0))];
        double[] Expanded(double[] values) => [.. values.SelectMany((value, i) => Enumerable.Repeat(value, (int)copies[i]))];
        var pairs = All(Checked([X], Y, copies: copies)).Zip(All(Checked([Expanded(X)], Expanded(Y))));
        Assert.All(pairs, pair => VectorFile.Near(Statistic(pair.Second).Statistic, Statistic(pair.First).Statistic, 1e-9));
    }

    [Fact]
    public void The_simulated_p_depends_on_nothing_but_the_seed()
    {
        var fit = Checked([X], Y);
        var first = Statistic(JarqueBera.Of(fit, 1)).SimulatedP!.Value;
        Assert.Equal(first, Statistic(JarqueBera.Of(fit, 1)).SimulatedP);
        Assert.NotEqual(first, Statistic(JarqueBera.Of(fit, 2)).SimulatedP);
        Assert.Equal(Statistic(JarqueBera.Of(fit, 2)).SimulatedP!.Value, first, 0.05);
    }

    /// <summary>Deleting a row and refitting gives the studentised residual (the definition).</summary>
    [Fact]
    public void The_studentised_residual_is_that_of_the_fit_without_the_row()
    {
        var row = RowInfluence.OfAll(Checked([X], Y))[5];
        double[] Without(double[] values) => [.. values.Where((_, i) => i != 5)];
        var fit = new GroupAnalysis(new MatrixDesign(true, [Without(X)], [], Without(Y))).Fit;
        var predicted = fit.Coefficients[0] + (fit.Coefficients[1] * X[5]);
        var error = fit.Sigma!.Value / Math.Sqrt(1 - row.Leverage);
        VectorFile.Near((Y[5] - predicted) / error, row.StudentisedResidual, 1e-9);
    }

    private static CheckOutcome[] All(CheckedFit fit) =>
    [
        BreuschPagan.Studentised(fit), BreuschPagan.Original(fit), White.Of(fit), JarqueBera.Of(fit, 1), ShapiroWilk.Of(fit), AndersonDarling.Of(fit), Reset.Of(fit),
        LargestResidual.Of(fit, RowInfluence.OfAll(fit)),
    ];

    private static CheckedFit Checked(double[][] columns, double[] y, double[]? copies = null, bool sampling = false)
    {
        return Checked(new MatrixDesign(true, columns, [], y, copies: copies), sampling);
    }

    private static CheckedFit Checked(MatrixDesign design, bool sampling = false)
    {
        var final = FinalFactor.Of(FactorBuilder.Build(design));
        var store = new ResidualStore();
        var pass = RowPass.Run(design, final, [], [store]);
        return new CheckedFit(design, final, new Fit(final, pass), store, sampling);
    }

    private static CheckStatistic Statistic(CheckOutcome outcome) => Assert.IsType<CheckStatistic>(outcome);

    private static CheckImpediment Why(CheckOutcome outcome) => Assert.IsType<NoCheck>(outcome).Why;
}
