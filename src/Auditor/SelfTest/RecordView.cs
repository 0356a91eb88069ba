using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>The parts of an audit's record that comparisons need.</summary>
internal sealed class RecordView(JsonElement root)
{
    public JsonElement Root => root;

    public JsonElement FinalFit => Root.GetProperty("final_fit");

    public JsonElement Collinearity => Root.GetProperty("collinearity");

    public JsonElement Checks => Root.GetProperty("checks");

    public JsonElement Influence => Root.GetProperty("influence");

    public JsonElement AllLeftOut => Root.GetProperty("all_left_out");

    public JsonElement Exclusion(string group) =>
        Root.GetProperty("exclusions").Find("group", group) ?? throw new InvalidOperationException("The record has no group " + group);

    public JsonElement? Coefficient(string label) => FinalFit.GetProperty("coefficients").Find("name", label);

    public static JsonElement? Test(JsonElement exclusion, string test)
    {
        JsonElement found = exclusion.GetProperty("tests").GetProperty(test);
        return found.ValueKind == JsonValueKind.Null ? null : found;
    }

    /// <summary>Names of the columns reported as adding nothing, of a fit or of a group.</summary>
    public static IReadOnlyList<string> Aliased(JsonElement owner) =>
        [.. owner.GetProperty("aliased").EnumerateArray().Select(column => column.Text("column"))];
}
