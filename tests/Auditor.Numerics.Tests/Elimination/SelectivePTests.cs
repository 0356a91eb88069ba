using Auditor.Numerics.Elimination;
using Auditor.Numerics.Random;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>Selective p against draws of whole responses, and its law when nothing left out has an effect.</summary>
public sealed class SelectivePTests
{
    private const int Draws = 1500;

    public static TheoryData<DroppingCriterion, double, int> Rules => new()
    {
        { DroppingCriterion.PartialF, 0.05, 11 }, { DroppingCriterion.PartialF, 0.3, 12 }, { DroppingCriterion.Aic, 0, 13 }, { DroppingCriterion.Bic, 0, 14 },
    };

    /// <summary>
    /// Brute force on rows: new errors turn the residual within the span of the group and what is left, its length kept; the rule is replayed by refitting every model. The
    /// share beyond the observed one among the draws with the same end, within four standard errors.
    /// </summary>
    [Theory]
    [MemberData(nameof(Rules))]
    public void Draws_of_whole_responses_agree(DroppingCriterion criterion, double bound, int seed)
    {
        var random = new Generator((ulong)seed);
        int[] kept = [0];
        var (data, expected) = Chosen(random, kept, criterion, bound);
        var rule = new DroppingRule(criterion, bound);
        for (var group = 0; group < 3; group++)
        {
            var found = Assert.IsType<SelectiveTest>(data.Case(kept).Selective(group, rule));
            var (inside, beyond) = Share(random, data, kept, group, data.Naive(kept, criterion, bound), expected);
            Within(inside / (double)Draws, found.Selection, Draws);
            Within(beyond / (double)inside, found.Probability, inside);
        }
    }

    /// <summary>Kolmogorov and Smirnov at 0.1 %: 1.95/sqrt(m) (large-sample value; from memory). The longer study is in tests/Auditor.Simulation.</summary>
    [Theory]
    [InlineData(DroppingCriterion.PartialF, 0.05, 21)]
    [InlineData(DroppingCriterion.Aic, 0, 22)]
    public void Without_any_effect_p_is_uniform(DroppingCriterion criterion, double bound, int seed)
    {
        var rule = new DroppingRule(criterion, bound);
        var found = new List<double>();
        for (var draw = 0UL; found.Count < 300; draw++)
        {
            var data = new RandomElimination(new Generator((ulong)seed, draw), 40, [1, 1, 2, 1], [1, 0, 0, 0]);
            if (data.Case([0]).Selective(draw % 2 == 0 ? 0 : 1, rule) is SelectiveTest test)
            {
                found.Add(test.Probability);
            }
        }

        found.Sort();
        var distance = found.Select((p, i) => Math.Max(Math.Abs(p - (i / 300.0)), Math.Abs(p - ((i + 1) / 300.0)))).Max();
        Assert.InRange(distance, 0, 1.95 / Math.Sqrt(300));
    }

    [Fact]
    public void A_rule_that_ends_elsewhere_gives_no_value()
    {
        var data = new RandomElimination(new Generator(9), 60, [1, 1, 1], [1, 2, 0]);
        var none = Assert.IsType<NotComputable>(data.Case([0]).Selective(1, new DroppingRule(DroppingCriterion.PartialF, 0.05)));
        Assert.Equal(Impediment.RuleEndsElsewhere, none.Why);
    }

    [Fact]
    public void Units_of_the_response_and_the_coding_of_a_group_change_nothing()
    {
        var rule = new DroppingRule(DroppingCriterion.Aic, 0);
        var (data, _) = Chosen(new Generator(31), [0], DroppingCriterion.Aic, 0);
        var units = data.Ordered([0]);
        double[] sum = [.. units[2][0].Zip(units[2][1], (a, b) => (2 * a) - b + 5)];
        var other = new EliminationCase(
            new MatrixDesign(true, [[.. units[0][0].Select(value => 1e3 * value)]], [units[1], [units[2][1], sum], units[3]], [.. data.Y.Select(y => 40 - (1e-4 * y))]), 1);
        for (var group = 0; group < 3; group++)
        {
            VectorFile.Near(Assert.IsType<SelectiveTest>(data.Case([0]).Selective(group, rule)).Probability, other.Selective(group, rule).P, 1e-8);
        }
    }

    /// <summary>The first draw on which the rule keeps the first unit and drops the other three (one, two and one columns).</summary>
    private static (RandomElimination Data, int[] Kept) Chosen(Generator random, int[] kept, DroppingCriterion criterion, double bound)
    {
        while (true)
        {
            var data = new RandomElimination(random, 20, [1, 1, 2, 1], [0.8, 0.3, 0, 0.2]);
            if (data.Naive(kept, criterion, bound).Run(data.Y).Kept is [0])
            {
                return (data, [0]);
            }
        }
    }

    private static (int Inside, int Beyond) Share(Generator random, RandomElimination data, int[] kept, int group, NaiveElimination rule, int[] expected)
    {
        double[][] final = [data.Ones, .. data.Ordered(kept)[0]];
        double[][] with = [.. final, .. data.Ordered(kept)[group + 1]];
        var left = NaiveElimination.Residual(final, data.Y);
        double[] fitted = [.. data.Y.Zip(left, (y, e) => y - e)];
        var rest = NaiveElimination.Residual(with, data.Y);
        double[] explained = [.. left.Zip(rest, (e, r) => e - r)];
        var (rho, unitRest, unitExplained) = (Length(left), Length(rest), Length(explained));
        var observed = unitExplained / unitRest;
        var (inside, beyond) = (0, 0);
        for (var draw = 0; draw < Draws; draw++)
        {
            var errors = RandomElimination.Normals(random, data.Y.Length);
            var (all, outside) = (NaiveElimination.Residual(final, errors), NaiveElimination.Residual(with, errors));
            var tangent = Length([.. all.Zip(outside, (a, b) => a - b)]) / Length(outside);
            var secant = Math.Sqrt(1 + (tangent * tangent));
            double[] y = [.. fitted.Select((f, i) => f + (rho * ((rest[i] / unitRest) + (tangent * explained[i] / unitExplained)) / secant))];
            if (rule.Run(y).Kept.SequenceEqual(expected))
            {
                inside++;
                beyond += tangent >= observed ? 1 : 0;
            }
        }

        return (inside, beyond);
    }

    private static double Length(double[] values) => Math.Sqrt(NaiveElimination.Dot(values, values));

    private static void Within(double share, double probability, int draws) => Assert.InRange(
        share - probability, -4 * Math.Sqrt(Math.Max(probability * (1 - probability), 1e-4) / draws), 4 * Math.Sqrt(Math.Max(probability * (1 - probability), 1e-4) / draws));
}
