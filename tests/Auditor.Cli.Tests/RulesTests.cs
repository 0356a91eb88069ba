namespace Auditor.Cli.Tests;

public sealed class RulesTests
{
    [Fact]
    public void Rules_and_facts_are_listed_and_each_rule_is_explained()
    {
        using var folder = new TemporaryFolder();
        var listed = ProgramRun.In(folder, "rules").Ends(0).Output.Split('\n');

        Assert.Contains("    exclusion-not-supported (high)", listed);
        Assert.Contains("    p_adjusted (number, p): p of the basis test, adjusted for the number of groups.", listed);
        Assert.Empty(folder.Files());
    }

    [Fact]
    public void One_rule_is_explained_with_the_policy_in_force()
    {
        using var folder = new TemporaryFolder().With("firm.yaml", "significance: 0.01\n");
        var explained = ProgramRun.In(folder, "rules", "exclusion-not-supported", "--policy", "firm.yaml").Ends(0).Output;

        Assert.Contains("\n  significance: 0.01\n", explained, StringComparison.Ordinal);
        Assert.Contains("\nWritten at: rules/exclusions.yaml, line ", explained, StringComparison.Ordinal);
    }
}
