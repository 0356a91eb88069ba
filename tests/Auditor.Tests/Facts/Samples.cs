using Auditor.Findings;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Tests.Facts;

/// <summary>Results for the tests of facts: invented figures, no computation.</summary>
internal static class Samples
{
    public static readonly GroupTests NoTests = new(null, null, null, null, null, null, null, null, null, null, null, null, null, null, null, null);

    public static readonly Influence Influence = new([17], [new InfluentialRow(3, "QL-10003", 0.4, 2.1, 1.2, 1.8)]);

    public static readonly Collinearity Collinearity = new([new TermCollinearity("engine_hours", 1, 12, 3.46)], [1, 40], []);

    public static readonly Exclusion Tested = new(
        "engine condition", ["engine_hours", "engine_hours^2"], 480, 2, 470, 12.5, 12.1,
        NoTests with { Classical = new TestFigures(7.8, 2, 470, 0.0005) },
        new Dictionary<string, string> { ["cluster"] = "no cluster declared" },
        "hc3", "no cluster and no time declared", 0.03, null, 0.06, null,
        new SelectiveFigures(null, "no elimination rule declared"),
        new EffectFigures(0.032, 0.01, 0.06, 0.008, 0.07, null), 410,
        new NegligibleFigures(0.01, 0.9, 0.95, null), new PowerFigures(0.44, 0.02, 1100, null),
        null, Verdicts.Inconclusive, Materialities.NotShown, "neither rejected nor shown negligible", [], []);

    public static readonly Exclusion Untestable = Tested with
    {
        Group = "dealer bonus",
        Df1 = 0,
        P = null,
        PAdjusted = null,
        Tests = NoTests,
        TestsNotComputed = new Dictionary<string, string> { ["classical"] = "the group adds no rank" },
        PartialRSquared = new EffectFigures(null, null, null, null, null, "no rank, no effect"),
        Verdict = Verdicts.Untestable,
        Reason = "its columns equal those of the final model",
        Line = 31,
    };

    /// <summary>By region: tested in one part, too few rows in the other; and not divided by dealer.</summary>
    public static readonly Exclusion Divided = Tested with
    {
        InParts =
        [
            new GroupInParts("dealer", Divisions.Segment, [], new DifferenceFigures(0, null, null, null, null, "too many dealers"), "too many dealers"),
            new GroupInParts(
                "region",
                Divisions.Segment,
                [
                    new PartFigures("coast", 300, "hc3", new TestFigures(6, 2, 290, 0.003), 0.006, null, new EffectFigures(0.04, 0.01, 0.08, 0.01, 0.09, null), null),
                    new PartFigures("hills", 7, null, null, null, null, new EffectFigures(null, null, null, null, null, "7 rows"), "7 rows"),
                ],
                new DifferenceFigures(1, null, null, null, null, "one part"),
                null),
        ],
        Line = 12,
    };

    public static readonly FitSummary Fit = new(
        480, 6, 474, 12.5, 0.16, 0.4, 0.39, 63, 5, 474, 1e-30, null, 100, -190, -160, 12, 13, [], [], [], null);

    public static readonly StructureCounts Structure = new(480, 12, 60, 0, 40, 24, 3, 7);

    public static readonly RowAccount Rows = new(
        520, 20, 10, 7, 3, 480, new Dictionary<string, int> { ["age"] = 2, ["price"] = 1500, ["grade"] = 0 }, new Dictionary<string, int> { ["log(price)"] = 3 }, []);

    public static readonly AcceptanceEntry Acceptance = new(
        "exclusion-inconclusive", "engine condition", "tractor-lease-loss", "2026.2", Severity.Medium, new WorstAccepted(0.05, 0.04), "R. Okafor",
        new DateOnly(2026, 3, 1), new DateOnly(2026, 12, 31), "More leases run out in autumn.", 4);

    public static readonly AcceptanceStanding Standing =
        new(Acceptance, "2026.2", new DateOnly(2026, 12, 1), Severity.Medium, 0.06, 0.032, [], "");

    public static Policy Policy(string firm = "significance: 0.05") =>
        PolicyReader.Read("significance: 0.05", "policy.yaml", firm, "firm.yaml").Value!;
}
