using Auditor.Numerics.ResidualChecks;
using static Auditor.Numerics.Tests.ResidualChecks.Checks;

namespace Auditor.Numerics.Tests.ResidualChecks;

/// <summary>Which columns White's check takes, and what must not change it (from the definition, no source).</summary>
public sealed class WhiteTests
{
    private static readonly double[] X = [.. Enumerable.Range(0, 400).Select(i => (i * 7 % 40) / 8.0)];
    private static readonly double[] Y = [.. X.Select((x, i) => 1 + x + ((1 + x) * Math.Sin(i * 1.7)))];

    [Fact]
    public void What_adds_nothing_is_left_out()
    {
        double[] half = [.. X.Select((_, i) => i % 2.0)];
        double[] other = [.. half.Select(value => 1 - value)];
        Assert.Equal(2, Statistic(White.Of(Fit([X], Y))).Df);
        Assert.Equal(1, Statistic(White.Of(Fit([half], Y))).Df);
        Assert.Equal(4, Statistic(White.Of(Fit([X, half], Y))).Df);
        Assert.Equal(1, Statistic(White.Of(Fit([half, other], Y))).Df);
    }

    /// <summary>13 numbers have 1 + 13 + 91 = 105 columns; 12 have 91.</summary>
    [Theory]
    [InlineData(12, false, 90)]
    [InlineData(13, true, 2)]
    public void More_than_100_columns_make_it_rest_on_the_fitted_value(int numbers, bool onFittedValues, int df)
    {
        var check = Statistic(White.Of(Fit(Numbers(numbers), Y)));
        Assert.Equal(onFittedValues, check.OnFittedValues);
        Assert.Equal(df, check.Df);
    }

    /// <summary>Levels multiply to nothing among themselves, so that 30 of them with one number are 1 + 30 + 1 (square) + 29 (products) = 61 columns.</summary>
    [Fact]
    public void Levels_that_never_meet_do_not_count_as_products()
    {
        double[][] levels = [.. Enumerable.Range(1, 29).Select(level => X.Select((_, i) => i % 30 == level ? 1.0 : 0).ToArray())];
        var check = Statistic(White.Of(Fit([X, .. levels], Y)));
        Assert.False(check.OnFittedValues);
        Assert.Equal(60, check.Df);
    }

    [Theory]
    [InlineData(2)]
    [InlineData(13)]
    public void Origin_and_scale_of_columns_and_response_do_not_matter(int numbers)
    {
        var columns = Numbers(numbers);
        double[][] moved = [.. columns.Select((column, c) => column.Select(value => (1024 * value) + (1e6 * (c + 1))).ToArray())];
        var expected = Statistic(White.Of(Fit(columns, Y)));
        var found = Statistic(White.Of(Fit(moved, [.. Y.Select(y => y + 1e6)])));
        VectorFile.Near(expected.Statistic, found.Statistic, 1e-7);
        Assert.Equal(expected.Df, found.Df);
    }

    private static double[][] Numbers(int count)
    {
        var generator = new Auditor.Numerics.Random.Generator(7);
        return [.. Enumerable.Range(0, count).Select(_ => X.Select(_ => generator.Normal()).ToArray())];
    }
}
