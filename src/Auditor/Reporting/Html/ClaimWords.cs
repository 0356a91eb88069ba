using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>What came of comparing the report's own figures, in words.</summary>
internal static class ClaimWords
{
    private static readonly Dictionary<string, string> Outcomes = new()
    {
        [ClaimOutcomes.Agrees] = "agrees",
        [ClaimOutcomes.LastDigit] = "differs in the last digit",
        [ClaimOutcomes.Differs] = "differs",
        [ClaimOutcomes.CannotBeRecomputed] = "cannot be recomputed",
    };

    /// <summary>"29 figures: 27 agree, 1 differs in the last digit, 1 differs."</summary>
    public static string Summary(AuditRecord record)
    {
        string[] parts =
        [
            .. Part(Count(record, ClaimOutcomes.Agrees), "agrees", "agree"),
            .. Part(Count(record, ClaimOutcomes.LastDigit), "differs in the last digit", "differ in the last digit"),
            .. Part(Count(record, ClaimOutcomes.Differs), "differs", "differ"),
            .. Part(Count(record, ClaimOutcomes.CannotBeRecomputed), "cannot be recomputed", "cannot be recomputed"),
        ];
        return $"{Figures(record.Claims.Count)}: {string.Join(", ", parts)}.";
    }

    /// <summary>One sentence when the report's own figures fail, else null.</summary>
    public static string? Failing(AuditRecord record)
    {
        int wrong = Count(record, ClaimOutcomes.Differs) + Count(record, ClaimOutcomes.LastDigit);
        int broken = Broken(record).Count;
        string of = $"of the {Figures(record.Claims.Count)} that the report prints";
        string contradictions = broken == 1 ? "1 contradiction between them stands whatever the data" : $"{NumberText.Count(broken)} contradictions between them stand whatever the data";
        return (wrong, broken) switch
        {
            (0, 0) => null,
            (0, _) => $"The {Figures(record.Claims.Count)} that the report prints: {contradictions}.",
            (_, 0) when record.Claims.Count == 1 => "The one figure that the report prints is not reproduced by the data.",
            (_, 0) => $"{NumberText.Count(wrong)} {of} {(wrong == 1 ? "is" : "are")} not reproduced by the data.",
            _ => $"{NumberText.Count(wrong)} {of} {(wrong == 1 ? "is" : "are")} not reproduced by the data; {contradictions}.",
        };
    }

    public static string? StandardErrors(AuditRecord record) => record.StandardErrorsReproducedBy switch
    {
        null => null,
        { Covariance: null } none => $"No covariance reproduces a reported standard error: {none.Why}.",
        { } some => $"Reported standard errors: {NumberText.Count(some.Reproduced)} of {NumberText.Count(some.Of)} are reproduced by the {Form(some.Covariance)} covariance"
            + (some.AlsoReproducedBy.Count == 0 ? "." : $"; {string.Join(", ", some.AlsoReproducedBy.Select(Form))} would reproduce as many, so their digits do not tell which was used."),
    };

    public static string Relations(AuditRecord record)
    {
        int all = record.ClaimsAgainstEachOther.Count;
        int broken = Broken(record).Count;
        return all == 0 ? "No figures are printed that could be held against each other."
            : broken == 0 ? $"{(all == 1 ? "The 1 relation" : $"All {NumberText.Count(all)} relations")} between the printed figures can hold."
            : $"{NumberText.Count(broken)} of {NumberText.Count(all)} relations between the printed figures cannot hold, whatever the data.";
    }

    public static ReportTable Table(AuditRecord record, IReadOnlyList<FindingPage> findings) =>
        Table("Figures of the report, recomputed", record.Claims, record, findings);

    /// <summary>The figures that the report prints for one left-out group.</summary>
    public static ReportTable TableOf(string group, AuditRecord record, IReadOnlyList<FindingPage> findings) => Table(
        $"Figures that the report prints for {group}, recomputed",
        [.. record.Claims.Where(claim => claim.Claim.StartsWith($"left_out[{group}].", StringComparison.Ordinal))],
        record,
        findings);

    private static ReportTable Table(string caption, IReadOnlyList<ClaimResult> claims, AuditRecord record, IReadOnlyList<FindingPage> findings) => ReportTable.Of(
        caption,
        claims,
        new("Figure", "text", claim => Cell.Words(claim.What)),
        new("As reported", "number", claim => new Cell(claim.Reported, null, "number", null)),
        new("Recomputed", "number", claim => claim.Recomputed is double whole && whole == Math.Round(whole) ? Cell.Count(whole) : Cell.Number(claim.Recomputed, claim.Why)),
        new("To the same digits", "number", claim => claim.Recomputed is double value
            ? new Cell(claim.RecomputedAsPrinted ?? NumberText.Number(value), NumberText.Full(value), "number", null)
            : Cell.Missing(claim.Why)),
        new("Outcome", "text", claim => Cell.Words(Outcome(claim, RowSetWords.Of(record.Policy))) with { Link = findings.FirstOrDefault(finding => finding.Finding.Subject == claim.Claim)?.Anchor }));

    public static ReportTable Contradictions(AuditRecord record) => ReportTable.Of(
        "Printed figures that cannot all be right",
        Broken(record),
        new("What must hold", "text", relation => Cell.Words(relation.Relation)),
        new("What is printed", "text", relation => Cell.Words(relation.Why ?? "")));

    /// <summary>An F or p of a left-out group that is the classical one: the verdict may rest on another.</summary>
    private static bool ByClassical(ClaimResult claim) => claim is { Outcome: ClaimOutcomes.Agrees, Kind: ClaimKinds.F or ClaimKinds.P } && OfGroup(claim);

    private static bool OfGroup(ClaimResult claim) => claim.Claim.StartsWith("left_out[", StringComparison.Ordinal);

    private static string Outcome(ClaimResult claim, RowSetWords rows) => string.Join(
        "; ",
        new[]
        {
            Outcomes.GetValueOrDefault(claim.Outcome) ?? CheckWords.Spaced(claim.Outcome),
            claim.ReproducedBy is { } form ? "by " + Form(form) : ByClassical(claim) ? "by the classical test" : null,
            claim.Rows is null ? null : "on " + (OfGroup(claim) ? rows.OtherOfGroup : rows.OtherOfModel),
            claim.Recomputed is null ? null : claim.Why,
        }.OfType<string>());

    private static string Form(string name) => FormNames.InWords(name);

    private static List<ClaimRelation> Broken(AuditRecord record) => [.. record.ClaimsAgainstEachOther.Where(relation => !relation.Consistent)];

    private static int Count(AuditRecord record, string outcome) => record.Claims.Count(claim => claim.Outcome == outcome);

    private static string Figures(int count) => count == 1 ? "1 figure" : NumberText.Count(count) + " figures";

    private static string[] Part(int count, string one, string many) => count == 0 ? [] : [$"{NumberText.Count(count)} {(count == 1 ? one : many)}"];
}
