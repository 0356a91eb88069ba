using Auditor.Analysis;
using Auditor.Numerics.ResidualChecks;

namespace Auditor.Tests.Analysis;

/// <summary>Which rows a picture of very many is made of.</summary>
public sealed class DrawnRowsTests
{
    private static readonly InfluenceSummary _influence = new(true, [1, 5], [Row(1_700_001), Row(3)], null, 2_000_000);

    [Fact]
    public void Of_few_rows_all_are_drawn()
    {
        var drawn = DrawnRows.Of(1000, _influence with { Largest = [] });
        Assert.Equal((1, 2), (drawn.OneIn, drawn.LeverageOne));
        Assert.Equal(Enumerable.Range(0, 1000), drawn.Positions);
        Assert.All(drawn.Positions, position => Assert.True(drawn.IsAtRandom(position)));
    }

    [Fact]
    public void Of_very_many_one_of_each_run_is_drawn_in_no_fixed_place_and_the_most_influential_always()
    {
        var drawn = DrawnRows.Of(2_000_000, _influence);
        Assert.Equal((4, 2), (drawn.OneIn, drawn.LeverageOne));
        Assert.Equal(drawn.Positions.Order(), drawn.Positions);
        Assert.Contains(3, drawn.Positions);
        Assert.Contains(1_700_001, drawn.Positions);
        int[] atRandom = [.. drawn.Positions.Where(drawn.IsAtRandom)];
        Assert.Equal(Enumerable.Range(0, 500_000), atRandom.Select(position => position / 4));
        Assert.All(Enumerable.Range(0, 4), place => Assert.InRange(atRandom.Count(position => position % 4 == place), 120_000, 130_000));
    }

    private static RowInfluence Row(int position) => new(position, 0.5, 4, 2, 3, false);
}
