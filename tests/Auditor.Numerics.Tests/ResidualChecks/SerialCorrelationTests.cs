using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>What the reference cases do not hold of Breusch–Godfrey and Ljung–Box: weights, gaps, units, what makes them void.</summary>
public sealed class SerialCorrelationTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + Math.Sin(i * 0.7) + (0.2 * Math.Cos(i * i)))];

    /// <summary>Source: values/make_serial_values.py, numpy on rows times sqrt(w).</summary>
    [Fact]
    public void Weighted_rows_enter_times_the_root_of_the_weight()
    {
        var one = SerialValues.List("weighted_breusch_godfrey");
        var fit = Fit([SerialValues.Numbers(one, "column")], SerialValues.Numbers(one, "response"), weights: SerialValues.Numbers(one, "weights"));
        var check = Statistic(BreuschGodfrey.Of(SerialValues.InOrder(fit), 4));
        VectorFile.Near(one.GetProperty("statistic").GetDouble(), check.Statistic, 1e-9);
        VectorFile.Near(check.Statistic / 40, check.Sizes.Single().Value, 1e-12);
    }

    /// <summary>Rows in any order give the same values as rows in time order.</summary>
    [Fact]
    public void The_order_of_the_rows_is_that_declared()
    {
        int[] places = [.. Enumerable.Range(0, 40).Select(i => i * 11 % 40)];
        var shuffled = Fit([[.. places.Select(place => X[place])]], [.. places.Select(place => Y[place])]);
        var order = SerialOrder.Of(new int[40], [.. places.Select(place => (long)place)])!;
        var (straight, moved) = (SerialValues.InOrder(Fit([X], Y)), new SerialFit(shuffled, order, false));
        Assert.All(Order(straight).Zip(Order(moved)), pair =>
        {
            VectorFile.Near(Statistic(pair.First).Statistic, Statistic(pair.Second).Statistic, 1e-9);
            VectorFile.Near(Statistic(pair.First).P, Statistic(pair.Second).P, 1e-8);
            VectorFile.Near(Statistic(pair.First).Sizes[0].Value, Statistic(pair.Second).Sizes[0].Value, 1e-9);
        });
    }

    /// <summary>From the definition (no source): only pairs that far apart in time are counted.</summary>
    [Fact]
    public void Ljung_Box_counts_the_pairs_there_are()
    {
        long[] periods = [.. Enumerable.Range(0, 40).Select(i => (long)(i < 15 ? i : i + 2))];
        var fit = new SerialFit(Fit([X], Y), SerialOrder.Of(new int[40], periods)!, false);
        var e = fit.Fit.Store.Residuals;
        var expected = 0.0;
        for (var k = 1; k <= 4; k++)
        {
            var pairs = Enumerable.Range(0, 40).SelectMany(i => Enumerable.Range(0, 40).Where(j => periods[i] - periods[j] == k).Select(j => e[i] * e[j])).ToArray();
            expected += 40 * 42.0 * Math.Pow(pairs.Sum() / e.Sum(value => value * value), 2) / pairs.Length;
        }

        VectorFile.Near(expected, Statistic(LjungBox.Of(fit, 4)).Statistic, 1e-9);
    }

    [Fact]
    public void What_makes_a_check_of_the_order_void_is_said()
    {
        int[] two = [.. Enumerable.Range(0, 40).Select(i => i % 2)];
        var units = new SerialFit(Fit([X], Y), SerialOrder.Of(two, [.. Enumerable.Range(0, 40).Select(i => (long)i / 2)])!, false);
        Assert.Equal(CheckImpediment.SeveralSeries, Why(BreuschGodfrey.Of(units, 1)));
        Assert.Equal(CheckImpediment.SeveralSeries, Why(LjungBox.Of(units, 4)));
        Assert.Equal(CheckImpediment.SeveralSeries, Why(UnitRootResidual.Of(units, Deterministic.Constant, 1)));
        Assert.Equal(2, Statistic(DurbinWatson.Of(units)).WithinUnits);

        var lagged = SerialValues.InOrder(Fit([X], Y), laggedResponse: true);
        Assert.Equal(CheckImpediment.LaggedResponse, Why(LjungBox.Of(lagged, 4)));
        Assert.IsType<CheckStatistic>(BreuschGodfrey.Of(lagged, 1));

        var copies = SerialValues.InOrder(Fit([X], Y, copies: [.. X.Select((_, i) => 1.0 + (i % 2))]));
        Assert.All(Order(copies), outcome => Assert.Equal(CheckImpediment.FrequencyWeights, Why(outcome)));
        Assert.All(Order(SerialValues.InOrder(Fit([X], [.. X.Select(x => 2 * x)]))), outcome => Assert.Equal(CheckImpediment.NoResiduals, Why(outcome)));
        Assert.Equal(CheckImpediment.TooFew, Why(LjungBox.Of(SerialValues.InOrder(Fit([], [1, 3, 2, 5])), 4)));
        Assert.Equal(CheckImpediment.TooFew, Why(BreuschGodfrey.Of(SerialValues.InOrder(Fit([], [1, 3, 2, 5])), 4)));
    }

    private static CheckOutcome[] Order(SerialFit fit) =>
        [DurbinWatson.Of(fit), BreuschGodfrey.Of(fit, 1), BreuschGodfrey.Of(fit, 4), LjungBox.Of(fit, 4), UnitRootResidual.Of(fit, Deterministic.Constant, 1)];
}
