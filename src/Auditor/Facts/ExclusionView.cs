using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>An exclusion with what its facts need beside it, and the reasons for its nulls.</summary>
internal sealed record ExclusionView(Exclusion Of, ExclusionInputs Inputs, Policy Policy)
{
    public bool? Rejects(double? p) => p is double value ? value <= Policy.Significance : null;

    /// <summary>Why the value at that path of the record is null; the exclusion's own reason when no closer one is given.</summary>
    public string Why(string path) => Of.Why.TryGetValue(path, out var why) ? why : Of.Reason;

    public string NotTested(string test) => Of.TestsNotComputed.TryGetValue(test, out var why) ? why : Why("tests." + test);
}
