using Auditor.Results;

namespace Auditor.Facts;

/// <summary>What the fit's facts need beside the fit.</summary>
/// <param name="Perfect">The residual sum of squares is at rounding level.</param>
/// <param name="LeftOutGroups">Groups of terms declared as left out.</param>
/// <param name="Influence">How single rows bear on the fit.</param>
/// <param name="Collinearity">How the fit's terms depend on each other.</param>
public sealed record FitInputs(bool Perfect, int LeftOutGroups, Influence Influence, Collinearity Collinearity)
{
    /// <summary>The report's own figures, compared.</summary>
    internal ClaimsAudit Claims { get; init; } = new([], null, []);

    /// <summary>What the author's stated rule of elimination does by itself; null when none is declared.</summary>
    public EliminationByRule? Elimination { get; init; }
}

/// <summary>The facts of the final model's fit on its own rows.</summary>
public static class FitFacts
{
    private static readonly FactFamily<FitView> Family = Elimination(new FactFamily<FitView>(About.Fit))
        .Count("rows", FactUnits.Rows, "Rows of the fit.", view => view.Fit.Rows)
        .Count("rank", FactUnits.Columns, "Coefficients the data can tell apart.", view => view.Fit.Rank)
        .Number("rows_per_coefficient", FactUnits.Rows, "Rows for each of those coefficients.",
            view => view.Fit.Rank > 0 ? (double)view.Fit.Rows / view.Fit.Rank : null, _ => "the model has no coefficient")
        .Number("df_residual", FactUnits.DegreesOfFreedom, "Residual degrees of freedom.", view => view.Fit.DfResidual)
        .Flag("saturated", "No residual degree of freedom is left.", view => view.Fit.DfResidual <= 0)
        .Flag("perfect", "The residuals are at rounding level although degrees of freedom are left.", view => view.Inputs.Perfect && view.Fit.DfResidual > 0)
        .Number("sigma", "the response's", "Residual standard deviation.", view => view.Fit.Sigma, Why)
        .Number("r_squared", FactUnits.None, "R² of the fit.", view => view.Fit.RSquared, Why)
        .Number("adjusted_r_squared", FactUnits.None, "R² adjusted for the number of coefficients.", view => view.Fit.AdjustedRSquared, Why)
        .Number("f", FactUnits.None, "F of all terms against the intercept alone.", view => view.Fit.F, Why)
        .Number("f_p", FactUnits.P, "Its classical p.", view => view.Fit.FP, Why)
        .Number("condition_number", FactUnits.None, "Largest scaled condition index, intercept included.", view => view.Fit.ConditionNumber, Why)
        .Number("trustworthy_digits", FactUnits.Digits, "Digits of the least certain coefficient that survive rounding.", view => view.Fit.TrustworthyDigits, Why)
        .Flag("has_aliased_columns", "At least one column equals a combination of others.", view => view.Fit.Aliased.Count > 0)
        .Count("aliased_columns", FactUnits.Columns, "Columns that equal a combination of others.", view => view.Fit.Aliased.Count)
        .Text("aliased", "Those columns, each with what it equals.", view => ColumnLists.Aliased(view.Fit.Aliased))
        .Flag("has_nearly_aliased_columns", "At least one column is nearly a combination of others.", view => view.Fit.NearlyAliased.Count > 0)
        .Text("nearly_aliased", "Those columns.", view => ColumnLists.Names(view.Fit.NearlyAliased))
        .Number("digits_lost", FactUnits.Digits, "Most digits lost by one of them.", view => ColumnLists.MostDigitsLost(view.Fit.NearlyAliased), ColumnLists.NoneNearlyAliased)
        .Count("left_out_groups", "groups", "Groups of terms declared as left out.", view => view.Inputs.LeftOutGroups)
        .Count("standard_errors_reported", "standard errors", "Standard errors that the report prints.", view => view.Inputs.Claims.StandardErrors?.Of ?? 0)
        .Count("standard_errors_reproduced", "standard errors", "Of those, how many the covariance reproduces that reproduces most.", view => view.Inputs.Claims.StandardErrors?.Reproduced ?? 0)
        .Text("standard_errors_reproduced_by", "That covariance.", view => view.Inputs.Claims.StandardErrors?.Covariance is { } covariance ? FormNames.InWords(covariance) : null, _ => "no covariance reproduces a reported standard error")
        .Flag("robust_standard_errors_reported", "That covariance is not the classical one.", view => view.Inputs.Claims.StandardErrors?.Covariance is not (null or "classical"))
        .Flag("reported_on_other_rows", "Figures of the final model are reproduced on the other row set, not on the fit shown.",
            view => view.Inputs.Claims.Figures.Any(claim => claim.Rows is not null && claim.Claim.StartsWith("reported.", StringComparison.Ordinal)))
        .Flag("has_leverage_one_rows", "At least one row has leverage 1: the model fits it whatever its response.", view => view.Inputs.Influence.LeverageOne.Count > 0)
        .Text("leverage_one_rows", "Those rows, by number.", view => ColumnLists.Numbers(view.Inputs.Influence.LeverageOne))
        .Number("largest_cooks_distance", FactUnits.None, "Largest Cook's distance of a row.", view => MostInfluential(view)?.CooksDistance, NoInfluence)
        .Text("most_influential_row", "The row of that distance, with its label where there is one.", view => RowName(MostInfluential(view)), NoInfluence)
        .Number("largest_gvif_scaled", FactUnits.None, "Largest generalised variance inflation of a term, to the power 1/(2 df).", view => MostInflated(view)?.GvifScaled, NoTerm)
        .Text("most_inflated_term", "The term of that inflation.", view => MostInflated(view)?.Term, NoTerm)
        .Flag("has_left_out_groups", "At least one group is declared as left out.", view => view.Inputs.LeftOutGroups > 0);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(string modelId, FitSummary fit, FitInputs inputs) => Family.From(new FitView(fit, inputs), modelId, null);

    private static FactFamily<FitView> Elimination(FactFamily<FitView> family) => family
        .Flag("rule_replayed", "A rule of elimination is declared and could be replayed.", view => view.Inputs.Elimination?.EndsInReportedModel is not null)
        .Flag("rule_ends_in_reported_model", "From the model with every candidate in, the stated rule ends in the reported model.",
            view => view.Inputs.Elimination?.EndsInReportedModel, NotReplayed)
        .Text("rule_keeps", "What the rule keeps although the report left it out.", view => Listed(view.Inputs.Elimination?.KeptThoughLeftOut), NotReplayed)
        .Text("rule_drops", "What the rule drops although the report kept it.", view => Listed(view.Inputs.Elimination?.DroppedThoughKept), NotReplayed)
        .Flag("steps_omit_groups", "Steps of elimination are declared, and a left-out group stands in none of them.", view => view.Inputs.Elimination?.GroupsNotInSteps.Count > 0)
        .Text("groups_not_in_steps", "Those groups.", view => string.Join(", ", view.Inputs.Elimination?.GroupsNotInSteps ?? []));

    private static string? Listed(IReadOnlyList<string>? names) => names is null ? null : names.Count == 0 ? "nothing" : string.Join(", ", names);

    private static string NotReplayed(FitView view) => view.Inputs.Elimination is { } elimination ? elimination.Why ?? "the rule could not be replayed" : "no elimination is declared";

    private static InfluentialRow? MostInfluential(FitView view) => view.Inputs.Influence.Largest is [var first, ..] ? first : null;

    private static string? RowName(InfluentialRow? row) => row switch
    {
        null => null,
        { Label: { } label } => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{row.Row} ({label})"),
        _ => row.Row.ToString(System.Globalization.CultureInfo.InvariantCulture),
    };

    private static TermCollinearity? MostInflated(FitView view) =>
        view.Inputs.Collinearity.Terms.Where(term => term.GvifScaled is not null).MaxBy(term => term.GvifScaled);

    private static string NoInfluence(FitView view) => view.Inputs.Influence.Why ?? "no row has a Cook's distance";

    private static string NoTerm(FitView view) => "no term beside the intercept has a variance inflation";

    private static string Why(FitView view) => view.Fit.Why ?? "the fit gives no value";

    private sealed record FitView(FitSummary Fit, FitInputs Inputs);
}
