using System.Collections.Concurrent;
using System.Globalization;
using System.Text.Json;

namespace Auditor.Tests.Reference;

/// <summary>A reference case beside the record of auditing one of its declarations. Records are made once and kept.</summary>
/// <param name="Variant">The ending of the declaration: empty, -largest, -powers, -largest-powers.</param>
internal sealed record CaseRun(ReferenceCase Case, string Variant, RecordView Record)
{
    private static readonly ConcurrentDictionary<string, Lazy<CaseRun>> Kept = new();

    /// <summary>The declaration has the largest model as its final one and leaves nothing out.</summary>
    public bool IsLargest => Variant.Contains("-largest", StringComparison.Ordinal);

    private bool FormsPowers => Variant.Contains("-powers", StringComparison.Ordinal);

    public string FitName => IsLargest ? "largest_model" : "final_model";

    public JsonElement Fit => Case.Values.GetProperty(FitName);

    public JsonElement? ExactFit => Case.Exact.Optional(FitName);

    /// <param name="policyLine">One more line of policy, or nothing.</param>
    public static CaseRun Of(string name, string variant = "", string policyLine = "") =>
        Kept.GetOrAdd(string.Join('|', name, variant, policyLine), _ => new Lazy<CaseRun>(() => Make(name, variant, policyLine))).Value;

    /// <summary>The record's label of a column that case.json calls by its own conventions: <c>a[l]:b</c> is <c>a = l * b</c>.</summary>
    public string Label(string column) => column == "(intercept)" ? "intercept" : string.Join(" * ", column.Split(':').Select(Part));

    private static CaseRun Make(string name, string variant, string policyLine)
    {
        string policy = ReferenceFiles.ReadText("policy-reference.yaml") + policyLine + "\n";
        JsonDocument record = AuditRunner.Run(ReferenceFiles.FullPath($"{name}/declaration{variant}.yaml"), policy);
        return new CaseRun(ReferenceCase.Named(name), variant, new RecordView(record));
    }

    private string Part(string part)
    {
        int bracket = part.IndexOf('[', StringComparison.Ordinal);
        return bracket >= 0 ? part[..bracket] + " = " + part[(bracket + 1)..^1] : Power(part);
    }

    private string Power(string column) =>
        FormsPowers && column.Length > 1 && column[0] == 'x' && int.TryParse(column.AsSpan(1), CultureInfo.InvariantCulture, out int power)
            ? string.Create(CultureInfo.InvariantCulture, $"x^{power}")
            : column;
}
