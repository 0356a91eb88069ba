using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Every check has a size beside its p, and the size does not grow with the number of rows. From the definitions, no source.</summary>
public sealed class CheckSizeTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 40).Select(i => (i * 7 % 40) / 10.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + ((1 + x) * Math.Sin(i * 1.7)) + (0.2 * Math.Cos(i * i)))];

    [Fact]
    public void Every_check_has_one()
    {
        Assert.All(All(Fit([X], Y)), outcome => Assert.NotEmpty(Statistic(outcome).Sizes));
        Assert.Equal(
            [SizeMeasure.AuxiliaryRSquared, SizeMeasure.AuxiliaryRSquared, SizeMeasure.AuxiliaryRSquared, SizeMeasure.Skewness, SizeMeasure.ExcessKurtosis,
             SizeMeasure.NormalPlotRSquared, SizeMeasure.DistanceFromNormal, SizeMeasure.PartialRSquared, SizeMeasure.PartialRSquared],
            All(Fit([X], Y)).SelectMany(outcome => Statistic(outcome).Sizes).Select(size => size.Measure));
    }

    /// <summary>Five copies of every row: statistics grow, sizes stay (Shapiro–Wilk and the single row apart, whose sample has changed).</summary>
    [Fact]
    public void Copies_of_the_data_leave_sizes_as_they_are()
    {
        double[] Repeated(double[] values) => [.. Enumerable.Repeat(values, 5).SelectMany(one => one)];
        var pairs = All(Fit([X], Y)).Zip(All(Fit([Repeated(X)], Repeated(Y)))).ToArray();
        foreach (var place in new[] { 0, 1, 2, 3, 6 })
        {
            var (once, often) = (Statistic(pairs[place].First), Statistic(pairs[place].Second));
            Assert.True(often.Statistic > 3 * once.Statistic);
            Assert.All(once.Sizes.Zip(often.Sizes), pair => VectorFile.Near(pair.First.Value, pair.Second.Value, 1e-8));
        }
    }

    [Fact]
    public void Sizes_are_what_they_say()
    {
        var fit = Fit([X], Y);
        var e = fit.Store.Residuals;
        double Moment(int power) => e.Sum(value => Math.Pow(value, power)) / 40;
        var bera = Statistic(JarqueBera.Of(fit, 1)).Sizes;
        VectorFile.Near(Moment(3) / Math.Pow(Moment(2), 1.5), bera[0].Value);
        VectorFile.Near((Moment(4) / Math.Pow(Moment(2), 2)) - 3, bera[1].Value);
        var koenker = Statistic(BreuschPagan.Studentised(fit));
        VectorFile.Near(koenker.Statistic / 40, koenker.Sizes[0].Value);
        var reset = Statistic(Reset.Of(fit));
        VectorFile.Near(2 * reset.Statistic / ((2 * reset.Statistic) + reset.Df2!.Value), reset.Sizes[0].Value);
        var serial = SerialValues.InOrder(fit);
        var first = e.Skip(1).Zip(e, (now, before) => now * before).Sum() / (40 * Moment(2));
        VectorFile.Near(first, Statistic(DurbinWatson.Of(serial)).Sizes.Single().Value);
        VectorFile.Near(first, Statistic(LjungBox.Of(serial, 1)).Sizes.Single().Value);
    }
}
