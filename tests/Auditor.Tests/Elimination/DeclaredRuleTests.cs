using System.Globalization;
using System.Text;
using Auditor.Numerics.Random;
using Auditor.Reporting;

namespace Auditor.Tests.Elimination;

/// <summary>What is said of a declared elimination on drawn data: y depends on a (strongly), b (clearly) and nothing else; a copies into a2.</summary>
public sealed class DeclaredRuleTests
{
    private static readonly string Data = Draw();

    [Fact]
    public void Without_a_declared_elimination_there_is_no_path_and_the_reason_stands_at_each_group()
    {
        var record = Run("");
        Assert.Null(record.EliminationByRule);
        Assert.Empty(record.Elimination);
        Assert.All(record.Exclusions, group => Assert.Equal((null, "no elimination is declared"), (group.Selective.P, group.Selective.Why)));
    }

    [Fact]
    public void A_rule_that_ends_in_the_reported_model_gives_every_group_its_p()
    {
        var record = Run("elimination: {rule: {drop_above: 0.05}}");
        Assert.True(record.EliminationByRule!.EndsInReportedModel);
        Assert.Equal(["a", "b"], record.EliminationByRule.Kept);
        Assert.Equal(3, record.EliminationByRule.Drops.Count);
        Assert.All(record.Exclusions, group => Assert.InRange(group.Selective.P!.Value, 1e-9, 1));
        Assert.All(record.Exclusions, group => Assert.Equal(group.Tests.Classical!.P, group.Selective.PlainP));
        Assert.Equal(3, record.Findings.Count(finding => finding.Rule == "exclusion-not-rejected-by-the-rule-that-chose"));
        Assert.DoesNotContain(record.Findings, finding => finding.Rule is "rule-does-not-end-in-reported-model" or "step-breaks-stated-rule");
    }

    [Fact]
    public void A_rule_that_ends_elsewhere_is_a_finding_and_gives_no_p()
    {
        var record = Run("elimination: {rule: {drop_above: 1e-30}, forced: [b], steps: [{drop: c}]}");
        var path = record.EliminationByRule!;
        Assert.False(path.EndsInReportedModel);
        Assert.Equal(["a"], path.DroppedThoughKept);
        Assert.Empty(path.KeptThoughLeftOut);
        Assert.Equal(["b"], path.Forced);
        Assert.Equal(["d and e", "f"], path.GroupsNotInSteps);
        Assert.All(record.Exclusions, group => Assert.Equal("the stated rule, replayed from all candidates, does not end in the reported model", group.Selective.Why));
        Assert.Contains(record.Findings, finding => finding.Rule == "rule-does-not-end-in-reported-model");
        Assert.Contains(record.Findings, finding => finding.Rule == "elimination-steps-omit-groups");
    }

    [Fact]
    public void Dropping_a_needed_group_breaks_the_rule_at_its_step()
    {
        var record = Run("elimination: {rule: {drop_above: 0.05}, steps: [{drop: f}, {drop: needed}]}", final: "[a]", groups: "[{group: needed, terms: [b]}, {group: f, terms: [f]}]");
        Assert.True(record.Elimination[1].BreaksRule);
        Assert.Equal("p < 0.0001 of needed is not above 0.05", record.Elimination[1].BreaksBecause);
        var finding = Assert.Single(record.Findings, finding => finding.Rule == "step-breaks-stated-rule");
        Assert.Equal(("step 2", 8), (finding.Subject, finding.Line));
        Assert.Equal(["needed"], record.EliminationByRule!.KeptThoughLeftOut);
        Assert.Equal(["f"], record.Findings.Where(one => one.Rule == "exclusion-not-rejected-by-the-rule-that-chose").Select(one => one.Subject));
    }

    [Fact]
    public void Judgement_breaks_nothing_and_gives_no_p()
    {
        var record = Run("elimination: {rule: {judgement: signs}, steps: [{drop: c}, {drop: f}]}");
        Assert.All(record.Elimination, step => Assert.False(step.BreaksRule));
        Assert.All(record.Elimination, step => Assert.NotNull(step.P));
        Assert.Equal("the groups were left out by judgement, which cannot be replayed", record.EliminationByRule!.Why);
        Assert.All(record.Exclusions, group => Assert.Equal(record.EliminationByRule.Why, group.Selective.Why));
    }

    [Fact]
    public void Sampling_weights_have_no_path()
    {
        var record = Run("elimination: {rule: {drop_worse: aic}, steps: [{drop: c}]}", weights: ", weights: {column: w, kind: sampling}");
        Assert.Null(record.EliminationByRule!.EndsInReportedModel);
        Assert.StartsWith("sampling weights", record.Elimination[0].Why, StringComparison.Ordinal);
        Assert.All(record.Exclusions, group => Assert.StartsWith("sampling weights", group.Selective.Why, StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("precision")]
    [InlineData("frequency")]
    public void Other_weights_have_one(string kind)
    {
        var record = Run("elimination: {rule: {drop_worse: bic}}", weights: $", weights: {{column: w, kind: {kind}}}");
        Assert.NotNull(record.EliminationByRule!.EndsInReportedModel);
    }

    [Fact]
    public void Term_by_term_the_terms_of_a_group_are_candidates_of_their_own()
    {
        var record = Run("elimination: {rule: {drop_above: 0.05}, by: term, steps: [{drop: d and e}]}");
        var path = record.EliminationByRule!;
        Assert.Equal(["c", "d", "e", "f"], path.Drops.Select(drop => drop.Drop).Order(StringComparer.Ordinal));
        Assert.All(path.Drops, drop => Assert.Equal(1, drop.Df1));
        Assert.Equal(2, record.Elimination[0].Df1);
        Assert.NotNull(record.Exclusions[1].Selective.P);
    }

    [Fact]
    public void A_copy_of_a_kept_term_goes_first_and_breaks_nothing()
    {
        var record = Run("elimination: {rule: {drop_above: 0.05}, steps: [{drop: f}, {drop: copy}]}", groups: "[{group: copy, terms: [a2]}, {group: f, terms: [f]}]");
        Assert.Equal(["copy", "f"], record.EliminationByRule!.Drops.Select(drop => drop.Drop));
        Assert.True(record.EliminationByRule.EndsInReportedModel);
        Assert.Equal([false, false], record.Elimination.Select(step => step.BreaksRule!.Value));
        Assert.Null(record.Elimination[1].F);
        Assert.NotNull(record.Exclusions[1].Selective.P);
    }

    [Fact]
    public void Threads_change_nothing() =>
        Assert.Equal(JsonRecord.Write(Run("elimination: {rule: {drop_above: 0.05}}")), JsonRecord.Write(Run("elimination: {rule: {drop_above: 0.05}}", threads: 4)));

    private static AuditRecord Run(
        string elimination, string final = "[a, b]", string groups = "[{group: c, terms: [c]}, {group: d and e, terms: [d, e]}, {group: f, terms: [f]}]", string weights = "", int threads = 1)
    {
        var declaration = $"audit: 1\nmodel: {{id: rule}}\ndata: {{source: data.csv{weights}}}\nresponse: y\nfinal_model: {{terms: {final}}}\nleft_out: {groups}\n\n{elimination}\n";
        var inputs = AuditRunner.Inputs(declaration, _ => new MemoryStream(Encoding.UTF8.GetBytes(Data))).Value!;
        return Audit.Run(inputs with { Threads = threads }).Value!;
    }

    private static string Draw()
    {
        var (random, text) = (new Generator(77), new StringBuilder("y,a,b,c,d,e,f,w,a2\n"));
        for (var row = 0; row < 120; row++)
        {
            double[] x = [.. Enumerable.Range(0, 6).Select(_ => random.Normal())];
            var y = 1 + x[0] + (0.6 * x[1]) + random.Normal();
            text.AppendJoin(',', x.Prepend(y).Append(1 + (row % 3)).Append((2 * x[0]) + 1).Select(value => value.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        return text.ToString();
    }
}
