using Auditor.Findings;

namespace Auditor.Tests.Reporting;

/// <summary>Findings of the sample record: every severity, one of them accepted.</summary>
internal static class SampleFindings
{
    public static IReadOnlyList<Finding> All { get; } =
    [
        new("exclusion-not-supported", Severity.High, "engine condition",
            "The data contradict leaving engine condition out: adjusted p is far below 0.05 and the effect is larger than the bound.",
            "Put the group back, or say on what grounds other than these data it stays out.", null, 38)
        {
            Source = "Holm (1979)",
        },
        new("exclusion-not-supported", Severity.High, "warranty extension",
            "The data contradict leaving warranty extension out.",
            "Put the group back, or say on what grounds other than these data it stays out.",
            new("Head of model validation", new(2026, 2, 10), new(2026, 12, 31), "The product is no longer sold; to be revisited with the next version."), 42)
        {
            Source = "Holm (1979)",
        },
        new("exclusion-inconclusive", Severity.Medium, SampleExclusions.LongGroup,
            "The data neither contradict nor support leaving this group out.",
            "Collect more rows, or state what effect would matter.", null, 47)
        {
            Source = "common practice",
        },
        new("claim-differs", Severity.Medium, "reported.coefficients[advance_rate].standard_error",
            "The report prints 0.014; the refit gives 0.0412.",
            "Correct the report or say how the figure was computed.", null, 61)
        {
            Source = "common practice",
        },
        new("unequal-variance", Severity.Low, "breusch_pagan",
            "The residual variance is not the same everywhere.",
            "Rely on the HC3 form, which does not assume it.", null, null)
        {
            Source = "Koenker (1981)",
        },
        new("rejected-but-negligible", Severity.Note, "previous owners",
            "The test rejects, and the effect is shown to be negligible.",
            "Nothing needs to be done.", null, 44)
        {
            Source = "Campbell & Lakens (2021)",
        },
    ];
}
