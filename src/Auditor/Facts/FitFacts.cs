using Auditor.Results;

namespace Auditor.Facts;

/// <summary>What the fit's facts need beside the fit.</summary>
/// <param name="Perfect">The residual sum of squares is at rounding level.</param>
/// <param name="LeftOutGroups">Groups of terms declared as left out.</param>
public sealed record FitInputs(bool Perfect, int LeftOutGroups);

/// <summary>The facts of the final model's fit on its own rows.</summary>
public static class FitFacts
{
    private static readonly FactFamily<FitView> Family = new FactFamily<FitView>(About.Fit)
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
        .Flag("has_left_out_groups", "At least one group is declared as left out.", view => view.Inputs.LeftOutGroups > 0);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(string modelId, FitSummary fit, FitInputs inputs) => Family.From(new FitView(fit, inputs), modelId, null);

    private static string Why(FitView view) => view.Fit.Why ?? "the fit gives no value";

    private sealed record FitView(FitSummary Fit, FitInputs Inputs);
}
