using Auditor.Numerics.Elimination;
using Auditor.Numerics.Random;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>The path of a rule, from R alone.</summary>
public sealed class PathTests
{
    public static TheoryData<DroppingCriterion, double> Rules => new()
    {
        { DroppingCriterion.PartialF, 0.05 }, { DroppingCriterion.PartialF, 0.3 }, { DroppingCriterion.Aic, 0 }, { DroppingCriterion.Bic, 0 },
    };

    [Theory]
    [MemberData(nameof(Rules))]
    public void Drops_are_those_of_refitting_every_model(DroppingCriterion criterion, double bound)
    {
        var steps = 0;
        for (var draw = 0UL; draw < 40; draw++)
        {
            var data = new RandomElimination(new Generator(7, draw), 30, [1, 2, 1, 1, 2, 3, 1], [0.5, 0, 0.2, 0, 0.3, 0, 0]);
            int[] kept = [0, 2];
            var (expected, dropped) = data.Naive(kept, criterion, bound).Run(data.Y);
            var path = data.Case(kept).Path(new DroppingRule(criterion, bound));
            Assert.Equal(dropped, path.Drops.Select(drop => drop.Unit));
            Assert.Equal(UnitSet.Of(expected), path.Kept);
            steps += dropped.Length;
        }

        Assert.True(steps > 80, $"only {steps} steps were compared");
    }

    [Fact]
    public void Equal_candidates_the_first_declared_goes()
    {
        double[] a = [1, 1, -1, -1, 1, 1, -1, -1], b = [1, -1, 1, -1, 1, -1, 1, -1], y = [2, 0, 0, -2, 1.5, 0.5, 0.5, -1.5];
        foreach (var criterion in Enum.GetValues<DroppingCriterion>())
        {
            var rule = new DroppingRule(criterion, 1e-9);
            double[] weak = [.. y.Select((value, i) => value + (i % 4 is 1 or 2 ? 4 : -4))]; // a and b equal in it, and weak
            Assert.Equal(0, new EliminationCase(new MatrixDesign(true, [], [[a], [b]], weak), forced: 1).Path(rule).Drops[0].Unit);
            Assert.Equal(0, new EliminationCase(new MatrixDesign(true, [], [[b], [a]], weak), forced: 1).Path(rule).Drops[0].Unit);
        }
    }

    [Fact]
    public void A_left_out_copy_goes_before_any_test_and_the_kept_original_is_tested_afterwards()
    {
        var data = new RandomElimination(new Generator(3), 40, [1, 1, 1], [2, 0, 0]);
        var units = data.Ordered([0]);
        var design = new MatrixDesign(true, [units[0][0]], [units[1], [[.. units[0][0].Select(value => (3 * value) - 1)]]], data.Y);
        var one = new EliminationCase(design, forced: 1);
        var path = one.Path(new DroppingRule(DroppingCriterion.PartialF, 0.05));

        Assert.Equal(2, path.Drops[0].Unit);
        Assert.Equal(Impediment.AddsNothing, Assert.IsType<NotComputable>(path.Drops[0].Test).Why);
        Assert.True(path.EndsInReported);
        Assert.IsType<SelectiveTest>(one.Selective(0, new DroppingRule(DroppingCriterion.PartialF, 0.05)));
        Assert.Equal(Impediment.AddsNothing, Assert.IsType<NotComputable>(one.Selective(1, new DroppingRule(DroppingCriterion.PartialF, 0.05))).Why);
    }

    [Fact]
    public void A_largest_model_without_degrees_of_freedom_or_residuals_has_no_path()
    {
        var data = new RandomElimination(new Generator(4), 5, [1, 2, 1], [0, 0, 0]);
        Assert.Equal(Impediment.NoResidualDegreesOfFreedom, data.Case([0]).Path(new DroppingRule(DroppingCriterion.Aic, 0)).Impediment);

        var exact = new RandomElimination(new Generator(4), 20, [1, 1], [0, 0]);
        exact.Y = [.. exact.Ordered([0])[1][0].Select(value => 1 + (2 * value))];
        var one = exact.Case([0]);
        Assert.Equal(Impediment.PerfectWithGroup, one.Path(new DroppingRule(DroppingCriterion.PartialF, 0.05)).Impediment);
        Assert.Equal(Impediment.PerfectWithGroup, Assert.IsType<NotComputable>(one.Selective(0, new DroppingRule(DroppingCriterion.PartialF, 0.05))).Why);
    }

    [Fact]
    public void Copies_count_as_rows_and_weights_as_scaled_rows()
    {
        var rule = new DroppingRule(DroppingCriterion.Aic, 0);
        var data = new RandomElimination(new Generator(5), 24, [1, 1, 2, 1], [1, 0, 0, 0.1]);
        double[] copies = [.. Enumerable.Range(0, 24).Select(i => 1.0 + (i % 3))];
        double[] Repeated(double[] column) => [.. column.SelectMany((value, i) => Enumerable.Repeat(value, (int)copies[i]))];
        double[] Scaled(double[] column) => [.. column.Select((value, i) => value * Math.Sqrt(copies[i]))];
        var units = data.Ordered([0]);
        var longer = new EliminationCase(new MatrixDesign(true, [Repeated(units[0][0])], [.. units[1..].Select(unit => unit.Select(Repeated).ToArray())], Repeated(data.Y)), 1);
        var scaled = new EliminationCase(new MatrixDesign(false, [Scaled(data.Ones), Scaled(units[0][0])], [.. units[1..].Select(unit => unit.Select(Scaled).ToArray())], Scaled(data.Y)), 1);
        AssertSame(longer, data.Case([0], copies: copies), rule);
        AssertSame(scaled, data.Case([0], weights: copies), rule);
    }

    private static void AssertSame(EliminationCase expected, EliminationCase actual, DroppingRule rule)
    {
        Assert.Equal(expected.Path(rule).Drops.Select(drop => drop.Unit), actual.Path(rule).Drops.Select(drop => drop.Unit));
        Assert.True(expected.Path(rule).EndsInReported);
        for (var group = 0; group < expected.Groups.Count; group++)
        {
            VectorFile.Near(Assert.IsType<SelectiveTest>(expected.Selective(group, rule)).Probability, actual.Selective(group, rule).P);
        }
    }
}
