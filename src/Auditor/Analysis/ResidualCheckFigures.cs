using Auditor.Data;
using Auditor.Numerics.ResidualChecks;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>All residual checks of the final model in the record's order; one that cannot be made says why.</summary>
internal static class ResidualCheckFigures
{
    private const string NoOrder = "no time order declared";
    private const string NoSplit = "no split declared";
    private const string OnFittedValues = "on the fitted value and its square, because the full form has more than 100 columns";
    private const string UpperBound = "p is at most the figure given: the published formula for p ends there";
    private const string PerfectWithPowers = "with the powers in, the model fits these rows to rounding, without them it does not: the statistic has no finite value";
    private const string PerfectWithoutRow = "without this row the model fits to rounding, with it it does not: the studentised residual has no finite value";

    public static IReadOnlyList<CheckResult> Of(
        CheckedFit fit, InfluenceSummary influence, RowSubset rows, double significance, long seed)
    {
        CheckResult Figure(string name, string assumption, CheckOutcome outcome) => Shown(name, assumption, outcome, rows, significance);
        return
        [
            Figure("breusch_pagan", Assumptions.EqualVariance, BreuschPagan.Studentised(fit)),
            Figure("breusch_pagan_original", Assumptions.EqualVariance, BreuschPagan.Original(fit)),
            Figure("white", Assumptions.EqualVariance, White.Of(fit)),
            Figure("jarque_bera", Assumptions.Normality, JarqueBera.Of(fit, (ulong)seed)),
            Figure("shapiro_wilk", Assumptions.Normality, ShapiroWilk.Of(fit)),
            Figure("anderson_darling", Assumptions.Normality, AndersonDarling.Of(fit)),
            Missing("durbin_watson", Assumptions.Independence, NoOrder),
            Missing("breusch_godfrey_1", Assumptions.Independence, NoOrder),
            Missing("breusch_godfrey_4", Assumptions.Independence, NoOrder),
            Missing("ljung_box_4", Assumptions.Independence, NoOrder),
            Missing("unit_root_residual", Assumptions.StationaryResidual, NoOrder),
            Figure("reset", Assumptions.Form, Reset.Of(fit)),
            Figure("largest_residual", Assumptions.NoOutlier, LargestResidual.Of(fit, influence)),
            Missing("chow", Assumptions.StableCoefficients, NoSplit),
        ];
    }

    private static CheckResult Shown(string name, string assumption, CheckOutcome outcome, RowSubset rows, double significance) => outcome switch
    {
        CheckStatistic check => new CheckResult(
            name, check.Statistic, check.Df, check.Df2, TestFigure.ShownP(check.P), assumption, (check.SimulatedP ?? check.P) <= significance, null)
        {
            Log10P = check.LogP is double log ? TestFigure.Log10(log) : null,
            PSimulated = check.SimulatedP,
            Draws = check.Draws,
            Row = Row(check.Position, rows),
            Variant = check.OnFittedValues ? OnFittedValues : check.PIsUpperBound ? UpperBound : null,
        },
        UnboundedCheck unbounded => new CheckResult(
            name, null, unbounded.Df, unbounded.Df2, 0, assumption, true, unbounded.Position is null ? PerfectWithPowers : PerfectWithoutRow)
        {
            Row = Row(unbounded.Position, rows),
        },
        NoCheck none => Missing(name, assumption, Words(none.Why)),
        _ => throw new ArgumentOutOfRangeException(nameof(outcome), outcome, "a check gives a statistic or a reason"),
    };

    private static int? Row(int? position, RowSubset rows) => position is int place ? rows.Rows[place] + 1 : null;

    private static CheckResult Missing(string name, string assumption, string why) => new(name, null, null, null, null, assumption, null, why);

    private static string Words(CheckImpediment why) => why switch
    {
        CheckImpediment.NoResiduals => "the final model leaves no residuals to check: it fits to rounding, or no degrees of freedom are left",
        CheckImpediment.TooFew => "too few rows, or too few degrees of freedom, for this check",
        CheckImpediment.TooMany => "more rows than this check is defined for",
        CheckImpediment.Saturated => "the check's auxiliary regression has as many columns as there are rows",
        CheckImpediment.EqualSquares => "all residuals have the same size: there is no difference in variance to explain",
        CheckImpediment.EqualResiduals => "all residuals are equal: they have no distribution to look at",
        CheckImpediment.PowersAddNothing => "the powers of the fitted value do not both add something to the final model's columns",
        CheckImpediment.NothingToRelate => "the final model has nothing but a constant to relate the residuals to",
        _ => "sampling weights: the check's reference distribution does not apply",
    };

    /// <summary>What a check is about, as the record writes it.</summary>
    private static class Assumptions
    {
        public const string EqualVariance = "equal_variance";
        public const string Normality = "normality";
        public const string Independence = "no_serial_correlation";
        public const string StationaryResidual = "stationary_residual";
        public const string Form = "functional_form";
        public const string NoOutlier = "no_outlier";
        public const string StableCoefficients = "stable_coefficients";
    }
}
