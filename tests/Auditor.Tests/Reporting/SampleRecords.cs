using System.Globalization;
using Auditor.Reporting;
using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>Records of an invented lender of farm machinery: one with every part filled, one with almost nothing in it, one too long for a small buffer.</summary>
internal static class SampleRecords
{
    private const string Sha = "3f0c5b1d9a7e4286c1d2e3f405162738495a6b7c8d9eaf00112233445566778f";

    public static AuditRecord Full { get; } = new(
        1,
        new("tractor-lease-loss", "Loss rate on defaulted tractor leases", "2026.2", "Model development", "loss_rate",
            ["advance_rate", "log(price)", "region", "age spline", "contract_months", "contract_years"], true),
        Outcomes.ExclusionsNotSupported,
        new(2614, 96, 0, 83, 4, 2431,
            new Dictionary<string, int> { ["loss_rate"] = 12, ["advance_rate"] = 0, ["price"] = 31, ["age"] = 47, ["engine_hours"] = 33 },
            new Dictionary<string, int> { ["log(price)"] = 4 },
            ["dealer_phone", "registration_year"]),
        Fit, Fit with { Rows = 1871, DfResidual = 1861, Rss = 24.336, Sigma = 0.114355 },
        SampleExclusions.All, SampleExclusions.Jointly,
        [new("suppressors", ["engine condition", "previous owners"], 3, 2384, 17.2, 4.7e-11, 9.4e-11)],
        SampleChecks.All, SampleChecks.Influence, SampleChecks.Collinearity,
        [
            new("reported.r_squared", "R²", "0.386", 0.3863, "agrees") { RecomputedAsPrinted = "0.386" },
            new("reported.coefficients[advance_rate].standard_error", "Standard error of advance_rate", "0.014", 0.0412, "differs") { RecomputedAsPrinted = "0.041" },
            new("left_out[engine condition].reported.p", "p of the left-out group engine condition", "0.49", 3.77848107e-17, "differs") { RecomputedAsPrinted = "3.78e-17" },
        ],
        [
            new(1, "engine condition", 38.4203138, 2, 2386, 3.77848107e-17, true, null) { BreaksBecause = "p < 0.0001 of engine condition is not above 0.05" },
            new(2, "warranty extension", null, null, null, null, null, "The step's model has no rows in common with the group."),
        ],
        SampleFindings.All,
        [new("influential-row", "warranty extension", "Cook's distance was not computed on this group's rows.")],
        Policy,
        new(Sha, "leases.csv", Sha.Replace('3', 'a'), "tractor lease/audit.yaml", Sha.Replace('f', '0'), "0.1.0", 1, "2026-03-01T06:30:00Z")
        {
            Acceptances = "accepted.yaml",
            AcceptancesSha256 = Sha.Replace('5', 'b'),
            AsOf = "2026-03-01",
        })
    {
        Plots = SamplePlots.Some,
        EliminationByRule = new(
            EliminationRules.DropAbove, 0.05, "group", ["advance_rate"], 1871,
            [
                new(1, "warranty extension", true, 0.31, 2, 1853, 0.7334, null, null, null),
                new(2, "contract_months", false, 1.12, 1, 1855, 0.29, null, null, null),
                new(3, "contract_years", true, null, null, null, null, null, null, "It adds no direction to what else is in."),
            ],
            ["log(price)", "region", "age spline", "engine condition"], false, ["engine condition"], ["contract_months"], ["previous owners"], null),
    };

    /// <summary>No left-out group, no check, no claim, and no number that can be null.</summary>
    public static AuditRecord MostlyNull { get; } = new(
        1, new("empty-field", null, null, null, "loss_rate", [], true), Outcomes.NothingFound,
        new(3, 0, 0, 0, 0, 3, new Dictionary<string, int>(), new Dictionary<string, int>(), []),
        new(3, 1, 2, 0, null, null, null, null, null, null, null, null, null, null, null, null, null, [], [], [], "The response does not vary."),
        null, [], null, [], [],
        new([], []) { Why = "The response does not vary." },
        new([], [], []) { Why = "The model has one column." },
        [], [], [], [], new Dictionary<string, object>(), new(Sha, "three.csv", Sha, "three.yaml", Sha, "0.1.0", 1, "2026-03-01T06:30:00Z"));

    /// <summary>More than a mebibyte as a page.</summary>
    public static AuditRecord Long { get; } = Full with
    {
        Exclusions = [.. Enumerable.Range(1, 400).Select(Numbered)],
    };

    public static AuditRecord WithoutFindings { get; } = Full with
    {
        Outcome = Outcomes.NothingFound,
        Exclusions = [SampleExclusions.All[3]],
        Findings = [],
        Undecided = [],
        Entangled = [],
    };

    private static FitSummary Fit => new(
        2431, 10, 2421, 31.62, 0.1142835015, 0.3863, 0.3840185874, 169.3249145, 9, 2421, 4.023e-249, -248.3953263, 1828.587353, -3635.174706, -3571.418068, 41.7, 9.3,
        [new("contract_years", "0.08333 * contract_months")], [new("age spline 3", 3.1)],
        [
            new("intercept", 0.0712, 0.0391, 1.8209718670, 0.0687345118, null, -0.0054729236, 0.1478729236, null),
            new("advance_rate", 0.3124, 0.0412, 7.5825242718, 4.79803944e-14, null, 0.2316090932, 0.3931909068, null),
            new("log(price)", -0.0418, 0.0052, -8.0384615385, 1.40791846e-15, null, -0.0519969106, -0.0316030894, null),
            new("region = south", -0.0221, 0.0071, -3.1126760563, 0.00187564460, null, -0.0360227048, -0.0081772952, null),
            new("region = west", 0.0087, 0.0068, 1.2794117647, 0.2008746940, null, -0.0046344214, 0.0220344214, null),
            new("region = east", 0.0133, 0.0072, 1.8472222222, 0.0648368771, null, -0.0008187992, 0.0274187992, null),
            new("age spline 1", 0.00214, 0.00031, 6.9032258065, 6.46967417e-12, null, 0.0015321073, 0.0027478927, null),
            new("age spline 2", -0.00131, 0.00088, -1.4886363636, 0.1367133928, null, -0.0030356310, 0.0004156311, null),
            new("age spline 3", 0.00047, 0.00021, 2.2380952381, 0.0253054352, null, 0.0000582017, 0.0008817983, null),
            new("contract_months", 0.00092, 0.00034, 2.7058823529, 0.0068600910, null, 0.0002532789, 0.0015867211, null),
            new("contract_years", null, null, null, null, null, null, null, "It equals 0.08333 * contract_months and adds nothing."),
        ],
        null);

    private static Dictionary<string, object> Policy => new()
    {
        ["significance"] = 0.05,
        ["adjustment"] = "holm",
        ["negligible_partial_r_squared"] = 0.01,
        ["power"] = 0.8,
        ["basis_without_structure"] = "hc3",
        ["row_set"] = "own",
        ["effective_rows_few"] = 1000,
    };

    private static Exclusion Numbered(int number) => SampleExclusions.All[number % SampleExclusions.All.Count] with
    {
        Group = string.Create(CultureInfo.InvariantCulture, $"candidate {number}"),
    };
}
