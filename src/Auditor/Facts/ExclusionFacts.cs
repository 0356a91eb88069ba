using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of one left-out group.</summary>
public static class ExclusionFacts
{
    private static readonly FactFamily<ExclusionView> Family = DependenceFacts.Added(Effect(Tests(new FactFamily<ExclusionView>(About.Exclusion))))
        .Count("other_rows", FactUnits.Rows, "Rows of the same test on the other row set.", view => view.Of.OtherRowSet?.Rows, SameRows)
        .Number("other_p", FactUnits.P, "p of the same test on the other row set.", view => view.Of.OtherRowSet?.P, SameRows)
        .Word("other_verdict", "Verdict on the other row set.", FactWords.Verdicts, view => view.Of.OtherRowSet?.Verdict, SameRows)
        .Flag("other_row_set_verdict_differs", "The verdict on the other row set is another one; false when both row sets are the same.",
            view => view.Of.OtherRowSet is { } other && other.Verdict != view.Of.Verdict)
        .Flag("has_aliased_columns", "At least one column of the group equals a combination of the final model's.", view => view.Of.Aliased.Count > 0)
        .Count("aliased_columns", FactUnits.Columns, "Columns of the group that equal a combination of others.", view => view.Of.Aliased.Count)
        .Text("aliased", "Those columns, each with what it equals.", view => ColumnLists.Aliased(view.Of.Aliased))
        .Flag("has_nearly_aliased_columns", "At least one column of the group is nearly a combination of others.", view => view.Of.NearlyAliased.Count > 0)
        .Text("nearly_aliased", "Those columns.", view => ColumnLists.Names(view.Of.NearlyAliased))
        .Number("digits_lost", FactUnits.Digits, "Most digits lost by one of them.", view => ColumnLists.MostDigitsLost(view.Of.NearlyAliased), ColumnLists.NoneNearlyAliased)
        .Flag("holds_main_effect_of_product", "A term of the group is part of a product outside the group.", view => view.Inputs.ProductsElsewhere.Count > 0)
        .Text("products_elsewhere", "Those products.", view => string.Join(", ", view.Inputs.ProductsElsewhere))
        .Flag("rests_on_one_row", "A row has leverage 1 with the group and not without it.", view => view.Inputs.OwnRows.Count > 0)
        .Text("own_rows", "Those rows, by number.", view => ColumnLists.Numbers(view.Inputs.OwnRows));

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(Exclusion exclusion, ExclusionInputs inputs, Policy policy) =>
        Family.From(new ExclusionView(exclusion, inputs, policy), exclusion.Group, exclusion.Line);

    private static FactFamily<ExclusionView> Tests(FactFamily<ExclusionView> family) => family
        .Text("group", "Name of the left-out group.", view => view.Of.Group)
        .Text("terms", "Its terms.", view => string.Join(", ", view.Of.Terms))
        .Text("because", "The author's reason for leaving it out.", view => view.Of.Because, _ => "the declaration gives no reason")
        .Count("rows", FactUnits.Rows, "Rows of the group's own test.", view => view.Of.Rows)
        .Count("df1", FactUnits.DegreesOfFreedom, "Rank that the group adds to the final model.", view => view.Of.Df1, Why("df1"))
        .Number("df2", FactUnits.DegreesOfFreedom, "Residual degrees of freedom with the group in.", view => view.Of.Df2, Why("df2"))
        .Word("basis", "The test on which the verdict rests.", FactWords.Bases, view => view.Of.Basis)
        .Text("basis_reason", "Why that test.", view => view.Of.BasisReason)
        .Number("p", FactUnits.P, "p of the basis test.", view => view.Of.P, Why("p"))
        .Number("p_adjusted", FactUnits.P, "p of the basis test, adjusted for the number of groups.", view => view.Of.PAdjusted, Why("p_adjusted"))
        .Text("p_in_words", "p_adjusted with p beside it; p alone where there is one group.", PInWords, Why("p_adjusted"))
        .Flag("rejects", "p is at most the policy's significance.", view => view.Rejects(view.Of.P), Why("p"))
        .Flag("rejects_adjusted", "p_adjusted is at most the policy's significance.", view => view.Rejects(view.Of.PAdjusted), Why("p_adjusted"))
        .Number("classical_p", FactUnits.P, "p of the classical partial F test.", view => view.Of.Tests.Classical?.P, view => view.NotTested("classical"))
        .Flag("classical_disagrees", "The classical test and the basis test, both unadjusted, fall on different sides of the policy's significance.",
            view => view.Rejects(view.Of.Tests.Classical?.P) is bool classical ? view.Rejects(view.Of.P) is bool basis ? classical != basis : null : null,
            view => view.Of.Tests.Classical?.P is null ? view.NotTested("classical") : view.Why("p"))
        .Number("selective_p", FactUnits.P, "p given the rule that left the group out.", view => view.Of.Selective.P, view => view.Of.Selective.Why ?? view.Why("selective.p"))
        .Flag("has_selective_p", "selective_p could be computed.", view => view.Of.Selective.P is not null)
        .Number("selective_plain_p", FactUnits.P, "p of the partial F on the rows of selective_p, without regard to the rule.", view => view.Of.Selective.PlainP, view => view.Of.Selective.Why ?? view.Why("selective.p"))
        .Count("selective_rows", FactUnits.Rows, "Rows on which the rule was replayed.", view => view.Of.Selective.Rows, view => view.Of.Selective.Why ?? view.Why("selective.p"))
        .Flag("left_out_by_rule", "A rule of elimination that looks at the data is declared, and replayed it drops the group (or it cannot be replayed).", view => view.Inputs.LeftOutByRule)
        .Word("verdict", "What the test says of leaving the group out.", FactWords.Verdicts, view => view.Of.Verdict)
        .Word("materiality", "What the interval says of the effect against the policy's bound.", FactWords.Materialities, view => view.Of.Materiality)
        .Text("reason", "What the verdict rests on, in words.", view => view.Of.Reason);

    private static FactFamily<ExclusionView> Effect(FactFamily<ExclusionView> family) => family
        .Number("partial_r_squared", FactUnits.PartialRSquared, "Estimated partial R² of the group.", view => view.Of.PartialRSquared.Estimate, Effect("estimate"))
        .Number("partial_r_squared_lower", FactUnits.PartialRSquared, "Lower limit of the basis interval.", view => view.Of.PartialRSquared.BasisLower, Effect("basis_lower"))
        .Number("partial_r_squared_upper", FactUnits.PartialRSquared, "Upper limit of the basis interval.", view => view.Of.PartialRSquared.BasisUpper, Effect("basis_upper"))
        .Number("effective_rows", FactUnits.Rows, "Independent rows that the data are worth for this question.", view => view.Of.EffectiveRows, Why("effective_rows"))
        .Number("negligible_p", FactUnits.P, "p of the null that the partial R² is at least the policy's bound.", view => view.Of.Negligible.P, Negligible("p"))
        .Number("negligible_p_adjusted", FactUnits.P, "negligible_p, adjusted for the number of groups.", view => view.Of.Negligible.PAdjusted, Negligible("p_adjusted"))
        .Number("power_at_bound", FactUnits.Probability, "Power of the basis test when the partial R² is at the policy's bound.", view => view.Of.Power.AtBound, Power("at_bound"))
        .Number("rows_needed", FactUnits.Rows, "Rows, clusters or periods needed for the policy's power at the bound.", view => view.Of.Power.RowsNeeded, Power("rows_needed"));

    private static string? PInWords(ExclusionView view) => (view.Of.P, view.Of.PAdjusted) switch
    {
        (double p, double adjusted) when view.Inputs.Groups > 1 =>
            $"adjusted {PlainNumber.PAgainst(adjusted, view.Policy.Significance)}, {PlainNumber.PAgainst(p, view.Policy.Significance)} before the adjustment for {PlainNumber.Count(view.Inputs.Groups)} groups",
        (double p, double) => PlainNumber.PAgainst(p, view.Policy.Significance),
        _ => null,
    };

    private static Func<ExclusionView, string> Why(string path) => view => view.Why(path);

    private static Func<ExclusionView, string> Effect(string name) => view => view.Of.PartialRSquared.Why ?? view.Why("partial_r_squared." + name);

    private static Func<ExclusionView, string> Negligible(string name) => view => view.Of.Negligible.Why ?? view.Why("negligible." + name);

    private static Func<ExclusionView, string> Power(string name) => view => view.Of.Power.Why ?? view.Why("power." + name);

    private static string SameRows(ExclusionView view) =>
        view.Of.OtherRowSet is null ? "both row sets are the same" : view.Why("other_row_set.p");
}
