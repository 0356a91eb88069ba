using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>One left-out group as the page shows it.</summary>
/// <param name="Anchor">Id of its section.</param>
/// <param name="NotComputed">Reasons, each with the tests it kept from being computed.</param>
internal sealed record ExclusionPage(
    Exclusion Exclusion, string Anchor, VerdictWords Verdict, ReportTable Tests, IReadOnlyList<Fact> NotComputed, FactList Decision, FactList Size,
    FactList? OtherRows)
{
    private const string MeaningOfSelective =
        "how often the group would explain this much or more if it had no effect, among data on which the stated rule leaves the same groups out; assumes that all candidates are "
        + "declared, the rule was followed, errors are independent and normal with equal variance and no other left-out group has an effect.";

    /// <summary>What the group adds, what is left over against its columns, what the rows could show.</summary>
    public IReadOnlyList<Picture> Pictures { get; init; } = [];

    /// <summary>The group in segments and in parts of the time span; empty when none is declared.</summary>
    public IReadOnlyList<PartsPage> Parts { get; init; } = [];

    /// <summary>Figures that the report prints for the group, recomputed; null where none can be.</summary>
    public ReportTable? Reported { get; init; }

    /// <summary>Findings about the group, for what to do next.</summary>
    public IReadOnlyList<FindingPage> Next { get; init; } = [];

    public static ExclusionPage Numbered(Exclusion exclusion, int index, double level, bool alone) =>
        Of(exclusion, "exclusion-" + (index + 1).ToString(CultureInfo.InvariantCulture), level, alone);

    /// <param name="alone">No adjustment: the only group, or the joint test.</param>
    public static ExclusionPage Of(Exclusion exclusion, string anchor, double level, bool alone) => Shown(ShownExclusion.Of(exclusion), anchor, level, alone);

    private static ExclusionPage Shown(Exclusion exclusion, string anchor, double level, bool alone) => new(
        exclusion, anchor, VerdictWords.Of(exclusion), TestTable.Of(exclusion, level), NotComputedOf(exclusion), DecisionOf(exclusion, level, alone), SizeOf(exclusion, level),
        exclusion.OtherRowSet is { } other ? OtherRowsOf(other, level) : null)
    {
        Parts = PartsPage.Of(exclusion, level),
    };

    private static IReadOnlyList<Fact> NotComputedOf(Exclusion exclusion) => FactList.Gathered(
        from test in TestWords.All
        where exclusion.TestsNotComputed.ContainsKey(test.Name) && test.Name != TestWords.NotDone
        select (test.Title, exclusion.TestsNotComputed[test.Name]));

    private static FactList DecisionOf(Exclusion exclusion, double level, bool alone) => FactList.Of([
        new("Rests on", Cell.Words(TestWords.TitleOf(exclusion.Basis)), exclusion.BasisReason),
        .. Level(exclusion),
        new("p", Cell.Probability(exclusion.P, exclusion.Log10P, level, Why(exclusion, "p"))),
        .. alone ? [] : new[] { new Fact("p, adjusted for all groups", Cell.Probability(exclusion.PAdjusted, exclusion.Log10PAdjusted, level, Why(exclusion, "p_adjusted")), "the verdict is judged by this one") },
        .. Selective(exclusion, level),
        new("p of the test that the effect is at least the bound", Cell.Probability(exclusion.Negligible.P, null, level, NegligibleWhy(exclusion, "p")), "small: shown to be negligible"),
        .. alone ? [] : new[] { new Fact("the same, adjusted for all groups", Cell.Probability(exclusion.Negligible.PAdjusted, null, level, NegligibleWhy(exclusion, "p_adjusted"))) },
    ]);

    /// <summary>On which level the group is observed, and what a form over clusters or periods can reach.</summary>
    private static IEnumerable<Fact> Level(Exclusion exclusion)
    {
        if (exclusion.Level is { } level)
        {
            yield return new Fact("Its columns vary on the level of", Cell.Words(level == "several" ? "several levels" : level));
        }

        if (exclusion.BasisSums is int sums)
        {
            var clustered = exclusion.Basis == "cluster";
            yield return new Fact(
                clustered ? "Clusters in this test" : "Periods in this test", Cell.Count(sums),
                clustered ? "they, not the rows, are what it counts as separate observations" : "they, not the rows, are what it takes its evidence from");
        }

        if (exclusion.BasisClustersOn is { } variable)
        {
            yield return new Fact("Its clusters", Cell.Name(variable), "rows with one value of it may move together, or share the group’s values");
        }

        // Under another test the record counts the declared clusters, on which that test does not rest.
        if (exclusion is { Basis: "cluster", EffectiveClusters: double clusters })
        {
            yield return new Fact("Clusters these are worth", Cell.Tenths(clusters), "equal clusters that would carry as much of this group");
        }

        if (exclusion.Ceiling is { } ceiling)
        {
            yield return new Fact("Where its p ends as the effect grows", Cell.Number(ceiling.P) with { Text = NumberText.Probability(ceiling.P, null, 0.5) }, "an effect also widens the spread this form allows for, so its p does not fall to 0");
        }
    }

    /// <summary>p given the rule, with what it means, and beside it the plain p on the same rows.</summary>
    private static IEnumerable<Fact> Selective(Exclusion exclusion, double level)
    {
        var given = exclusion.Selective;
        var rows = given.Rows is int common && common != exclusion.Rows
            ? $" On the {NumberText.Count(common)} rows that all groups have in common, where the rule is replayed; the verdict rests on {NumberText.Count(exclusion.Rows)}."
            : "";
        yield return new Fact(
            "p, given the rule that left the group out",
            Cell.Probability(given.P, given.Log10P, level, given.Why ?? Why(exclusion, "selective.p")),
            given.P is null ? null : MeaningOfSelective + rows);
        if (given.PlainP is double plain)
        {
            yield return new Fact(
                "Partial F’s p on the same rows", Cell.Probability(plain, null, level), "no evidence where it is large: the rule chose by it, on these rows");
        }
    }

    private static FactList SizeOf(Exclusion exclusion, double level)
    {
        EffectFigures effect = exclusion.PartialRSquared;
        PowerFigures power = exclusion.Power;
        string interval = NumberText.Percent(1 - (2 * level)) + " interval";
        return FactList.Of(
            new($"Against the bound {NumberText.Plain(exclusion.Negligible.Bound)}", Cell.Words(VerdictWords.Materiality(exclusion.Materiality)), "by this group’s own interval, before adjustment for the number of groups"),
            new("Partial R²", Cell.Share(effect.Estimate, EffectWhy("estimate")), "share of what the final model leaves over, as the classical fit has it; the intervals allow for chance and can lie beside it"),
            new(interval + " by the test the verdict rests on", BasisInterval(effect, EffectWhy("basis_lower"))),
            new(interval + ", classical", Cell.Range(effect.Lower, effect.Upper, EffectWhy("lower"), NumberText.Share)),
            new("Rows of this test", Cell.Count(exclusion.Rows)),
            new("Columns added", Cell.Count(exclusion.Df1, Why(exclusion, "df1"))),
            new("Independent rows these are worth", Whole(exclusion.EffectiveRows, Why(exclusion, "effective_rows")), "for this question, by the test the verdict rests on"),
            new("Power at the bound", Cell.Share(power.AtBound, PowerWhy("at_bound")), "chance to reject an effect that large"),
            new("Smallest effect found reliably", Cell.Share(power.SmallestDetectableFSquared, PowerWhy("smallest_detectable_f_squared")), "as Cohen’s f², which is R²/(1 − R²) of the partial R²; at the policy’s power"),
            new($"{char.ToUpperInvariant(power.CountedIn[0])}{power.CountedIn[1..]} needed at the bound", Whole(power.RowsNeeded, PowerWhy("rows_needed")), "for the policy’s power, before adjustment"));

        string? EffectWhy(string name) => effect.Why ?? Why(exclusion, "partial_r_squared." + name);
        string? PowerWhy(string name) => power.Why ?? Why(exclusion, "power." + name);
    }

    /// <summary>None is said in its place: where only the classical interval stands, a reader may take it for this one.</summary>
    private static Cell BasisInterval(EffectFigures effect, string? why) => effect.Why == ShownExclusion.CannotReject
        ? Cell.Words("none: " + effect.Why)
        : Cell.Range(effect.BasisLower, effect.BasisUpper, why, NumberText.Share);

    private static FactList OtherRowsOf(OtherRowSetFigures other, double level)
    {
        const string why = "It was not computed on these rows.";
        return FactList.Of(
            new("Verdict there", Cell.Words(VerdictWords.WordOf(other.Verdict))),
            new("Rows", Cell.Count(other.Rows)),
            new("F", Cell.Number(other.F, why)),
            new("on degrees of freedom", Cell.Df(other.Df1, other.Df2, why)),
            new("p, not adjusted", Cell.Probability(other.P, null, level, why)));
    }

    private static Cell Whole(double? rows, string? why) =>
        Cell.Count(rows is double count ? Math.Ceiling(count) : null, why) with { Full = rows is double full ? NumberText.Full(full) : null };

    private static string? NegligibleWhy(Exclusion exclusion, string name) => exclusion.Negligible.Why ?? Why(exclusion, "negligible." + name);

    private static string? Why(Exclusion exclusion, string path) => exclusion.Why.GetValueOrDefault(path);
}
