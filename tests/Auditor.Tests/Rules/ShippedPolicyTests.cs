using Auditor.Policies;

namespace Auditor.Tests.Rules;

public sealed class ShippedPolicyTests
{
    [Fact]
    public void Fixed_names_ship_with_their_fixed_defaults()
    {
        var policy = ShippedFiles.Policy();

        Assert.Equal((0.05, AdjustmentMethod.Holm, 0.01, 0.8), (policy.Significance, policy.Adjustment, policy.NegligiblePartialRSquared, policy.Power));
        Assert.Equal((BasisWithoutStructure.Hc3, RowSet.Own), (policy.BasisWithoutStructure, policy.RowSet));
    }

    [Fact]
    public void Every_value_has_a_comment_and_a_source_above_it()
    {
        var lines = ShippedFiles.Text("policy.yaml").Split('\n');
        var values = Enumerable.Range(0, lines.Length).Where(at => lines[at].Length > 0 && lines[at][0] is not '#').ToList();

        Assert.Equal(ShippedFiles.Policy().Names.Count, values.Count);
        Assert.All(values, at => Assert.Contains(
            "# Source: ", string.Join('\n', lines.Take(at).Reverse().SkipWhile(line => !line.StartsWith('#')).TakeWhile(line => line.StartsWith('#'))), StringComparison.Ordinal));
    }
}
