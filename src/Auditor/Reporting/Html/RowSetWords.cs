namespace Auditor.Reporting.Html;

/// <summary>Names the row set that the audit does not rest on; which one that is, the policy says.</summary>
/// <param name="common">The verdicts rest on the rows complete for every group.</param>
internal sealed class RowSetWords(bool common)
{
    private const string ForEvery = "the rows complete for every group";

    /// <param name="policy">Of the record; without the name the shipped value holds.</param>
    public static RowSetWords Of(IReadOnlyDictionary<string, object> policy) => new(policy.TryGetValue("row_set", out object? set) && set is "common");

    /// <summary>Beside a left-out group's own figures.</summary>
    public string OtherOfGroup => common ? "the rows complete for the group alone" : ForEvery;

    /// <summary>Beside the final model's own figures.</summary>
    public string OtherOfModel => common ? "the rows complete for the final model" : ForEvery;
}
