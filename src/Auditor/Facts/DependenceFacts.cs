using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of a group that come from the declared dependence between rows: its level, its clusters, what the score form can reach, who disagrees.</summary>
internal static class DependenceFacts
{
    private const string NoDependence = "no cluster, unit or time order declared";
    private const string NoScoreForm = "the verdict does not rest on a form over clusters or periods";

    public static FactFamily<ExclusionView> Added(FactFamily<ExclusionView> family) => family
        .Word("level", "The level on which the group's columns vary.", FactWords.Levels, view => view.Of.Level, _ => NoDependence)
        .Flag("varies_on_another_level", "All columns of the group are constant within period, cluster or unit, or vary on several levels.", view => view.Of.Level is { } level ? level != "row" : null, _ => NoDependence)
        .Number("effective_clusters", FactUnits.Clusters, "Equal clusters that those the test rests on, or the declared ones, are worth for this group.", view => view.Of.EffectiveClusters, view => view.NotTested("cluster"))
        .Text("basis_clusters_on", "The variable by which the test the verdict rests on sums rows into clusters.", view => view.Of.BasisClustersOn, _ => "the verdict does not rest on a form over clusters")
        .Flag("has_effective_clusters", "effective_clusters could be computed.", view => view.Of.EffectiveClusters is not null)
        .Flag("on_score_form", "The verdict rests on a form over clusters or periods with the null imposed.", view => view.Of.Ceiling is not null)
        .Number("ceiling_p", FactUnits.P, "The p at which the test ends as the group's effect grows without limit.", view => view.Of.Ceiling?.P, _ => NoScoreForm)
        .Flag("cannot_reject", "ceiling_p is above the policy's significance.", view => view.Of.Ceiling is { } ceiling ? ceiling.CannotReject : null, _ => NoScoreForm)
        .Flag("cannot_reject_adjusted", "ceiling_p is above the policy's significance after the factor that the policy's adjustment puts on the least p of all groups: as the first of them the group could not be rejected.",
            view => view.Of.Ceiling is { } ceiling ? ceiling.P * OnTheLeastP(view.Policy.Adjustment, view.Inputs.Groups) > view.Policy.Significance : null, _ => NoScoreForm)
        .Number("unrestricted_p", FactUnits.P, "p of the same kind of test with the group in the model.", view => view.Of.Ceiling?.UnrestrictedP, NoUnrestricted)
        .Flag("unrestricted_rejects", "unrestricted_p is at most the policy's significance.", view => view.Rejects(view.Of.Ceiling?.UnrestrictedP), NoUnrestricted)
        .Number("df2_per_column", "degrees of freedom", "Residual degrees of freedom for each column the group adds.", view => view.Of is { Df1: > 0 and var df1, Df2: double df2 } ? df2 / df1 : null, view => view.Why("df2"))
        .Count("groups", "groups", "Left-out groups with a p, for which the adjustment allows.", view => view.Inputs.Groups)
        .Text("counted_in", "What rows_needed counts: rows, clusters or periods.", view => view.Of.Power.CountedIn)
        .Flag("other_forms_disagree", "Some robust form, unadjusted, falls on the other side of the policy's significance than the basis test.", view => view.Of.P is null ? null : Disagreeing(view).Any(), view => view.Why("p"))
        .Text("disagreeing_forms", "Those forms.", view => view.Of.P is null ? null : string.Join(", ", Disagreeing(view)), view => view.Why("p"));

    /// <summary>Holm, Hochberg and Benjamini–Hochberg multiply the least of m p-values by m, Benjamini–Yekutieli by m (1 + 1/2 + … + 1/m), none by 1.</summary>
    private static double OnTheLeastP(AdjustmentMethod adjustment, int groups) => adjustment switch
    {
        AdjustmentMethod.None => 1,
        AdjustmentMethod.BenjaminiYekutieli => groups * Enumerable.Range(1, groups).Sum(k => 1.0 / k),
        _ => groups,
    };

    private static string NoUnrestricted(ExclusionView view) => view.Of.Ceiling is null ? NoScoreForm : view.Why("p");

    /// <summary>Only forms of the kind that the declaration asks for: without one, HC3 and the score form by rows.</summary>
    private static IEnumerable<string> Disagreeing(ExclusionView view)
    {
        var tests = view.Of.Tests;
        (string Name, double? P)[] forms = view.Of.Level is null
            ? [("hc3", tests.Hc3?.P), ("score", tests.Score?.P)]
            :
            [
                ("cluster", tests.Cluster?.P), ("cr1", tests.Cr1?.P), ("cr2", tests.Cr2?.P), ("wild_bootstrap", tests.WildBootstrap?.P),
                ("time", tests.Time?.P), ("time_unrestricted", tests.TimeUnrestricted?.P), ("newey_west", tests.NeweyWest?.P),
            ];
        // The form over clusters is the basis only where both are of the declared cluster.
        static bool IsBasis(ExclusionView view, string name) => name == view.Of.Basis && (name != "cluster" || view.Of.BasisTest is null || view.Of.Tests.Cluster?.F == view.Of.BasisTest.F);
        return forms.Where(form => form.P is not null && !IsBasis(view, form.Name) && view.Rejects(form.P) != view.Rejects(view.Of.P)).Select(form => FormNames.InWords(form.Name));
    }
}
