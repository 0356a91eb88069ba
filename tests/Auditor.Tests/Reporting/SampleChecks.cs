using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>Residual checks, influence and collinearity of the sample record. Invented figures; p from R 4.2 (pchisq, pf, pt).</summary>
internal static class SampleChecks
{
    private const string NoOrder = "no time order declared";

    public static IReadOnlyList<CheckResult> All { get; } =
    [
        new("breusch_pagan", 41.3, 9, null, 4.410648e-06, "equal_variance", true, null) { Size = new Dictionary<string, double> { ["auxiliary_r_squared"] = 0.01701 } },
        new("breusch_pagan_original", 63.8, 9, null, 2.468046e-10, "equal_variance", true, null),
        new("white", 88.1, 48, null, 0.0003710747, "equal_variance", true, null),
        new("jarque_bera", 5.11, 2, null, 0.07769223, "normality", false, null) { Size = new Dictionary<string, double> { ["skewness"] = 0.0412, ["excess_kurtosis"] = 0.211 } },
        new("shapiro_wilk", 0.9986, null, null, 0.0412, "normality", true, null),
        new("anderson_darling", 0.61, null, null, 0.1121, "normality", false, null),
        new("durbin_watson", null, null, null, null, "no_serial_correlation", null, NoOrder),
        new("breusch_godfrey_1", null, null, null, null, "no_serial_correlation", null, NoOrder),
        new("breusch_godfrey_4", null, null, null, null, "no_serial_correlation", null, NoOrder),
        new("ljung_box_4", null, null, null, null, "no_serial_correlation", null, NoOrder),
        new("unit_root_residual", null, null, null, null, "stationary_residual", null, NoOrder),
        new("reset", 2.31, 2, 2419, 0.09948018, "functional_form", false, null),
        new("largest_residual", 4.61, 2420, null, 0.01029781, "no_outlier", true, null),
        new("chow", null, null, null, null, "stable_coefficients", null, "no split declared"),
    ];

    public static Influence Influence { get; } = new(
        [1207],
        [
            new(418, "L-20418", 0.0312, 4.61, 0.0681, 0.827),
            new(1980, "L-21980", 0.0274, -3.92, 0.0431, -0.658),
            new(77, null, 0.0511, 2.4, 0.031, 0.557),
            new(1207, "L-21207", 1, null, null, null),
        ]);

    public static Collinearity Collinearity { get; } = new(
        [new("advance_rate", 1, 1.21, 1.1), new("log(price)", 1, 1.87, 1.3675), new("region", 3, 1.33, 1.0487), new("age spline", 3, 9.4, 1.4528)],
        [1, 2.31, 4.8, 18.9, 41.7],
        [
            new(18.9, new Dictionary<string, double> { ["intercept"] = 0.04, ["log(price)"] = 0.11, ["age spline 1"] = 0.71 }),
            new(41.7, new Dictionary<string, double> { ["intercept"] = 0.93, ["log(price)"] = 0.86, ["age spline 1"] = 0.02 }),
        ]);
}
