using Auditor.Reporting;
using Auditor.Results;
using Auditor.Tests.Reference;

namespace Auditor.Tests.Analysis.Claims;

/// <summary>Reference datasets audited with a report's figures in the declaration.</summary>
internal static class Reported
{
    /// <param name="variant">Ending of the case's declaration.</param>
    /// <param name="reported">YAML of the key reported, with its key; or nothing.</param>
    /// <param name="edit">Changes the declaration's text.</param>
    public static AuditRecord Of(string name, string variant, string reported, Func<string, string>? edit = null)
    {
        string declaration = ReferenceFiles.ReadText($"{name}/declaration{variant}.yaml");
        return AuditRunner.Record(
            (edit?.Invoke(declaration) ?? declaration) + "\n" + reported + "\n", file => File.OpenRead(ReferenceFiles.FullPath($"{name}/{file}")), ReferenceFiles.ReadText("policy-reference.yaml"));
    }

    /// <summary>Every figure that does not agree, with what it is.</summary>
    public static IReadOnlyList<string> Wrong(AuditRecord record) =>
        [.. record.Claims.Where(claim => claim.Outcome != ClaimOutcomes.Agrees).Select(claim => $"{claim.Claim} {claim.Reported} {claim.Recomputed} {claim.Outcome} {claim.Why}")];

    public static ClaimResult Claim(AuditRecord record, string path) => record.Claims.Single(claim => claim.Claim == path);
}
