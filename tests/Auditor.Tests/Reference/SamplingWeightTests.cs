using System.Text.Json;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>
/// Sampling weights: estimates and robust tests as with precision weights, which R's lm and sandwich check (insurance_claims in tests/reference), and no
/// classical test. The same weights are declared a second time as sampling weights and held against R's own figures.
/// </summary>
public sealed class SamplingWeightTests
{
    private const string Name = "insurance_claims";
    private const double Tolerance = 1e-8;

    private static readonly RecordView Sampled = Audited();

    [Fact]
    public void Estimates_agree_with_R_and_have_no_classical_standard_error()
    {
        CaseRun weighted = CaseRuns.Of(Name);
        List<JsonElement> expected = [.. weighted.Fit.GetProperty("coefficients").EnumerateArray()];
        Assert.Equal(7, expected.Count);
        Assert.All(expected, coefficient =>
        {
            JsonElement? found = Sampled.Coefficient(weighted.Label(coefficient.Text("name")));
            Figure estimate = new("estimate", coefficient.Text("name"), coefficient.Number("estimate"), null, found.Number("estimate"));
            Assert.True(estimate.Holds(Tolerance), estimate.Describe());
            Assert.Null(found.Number("standard_error"));
            Assert.Null(found.Number("p"));
        });
    }

    [Fact]
    public void Robust_tests_agree_with_R_and_decide()
    {
        Assert.Equal(2, CaseRuns.Of(Name).Case.Groups.Count());
        Assert.All(CaseRuns.Of(Name).Case.Groups, group =>
        {
            JsonElement exclusion = Sampled.Exclusion(group.Text("group"));
            foreach (string estimator in new[] { "HC0", "HC1", "HC2", "HC3" })
            {
                JsonElement expected = group.GetProperty("robust_wald").GetProperty(estimator);
                JsonElement? found = RecordView.Test(exclusion, estimator.ToLowerInvariant());
                Figure f = new(estimator, "f", expected.Number("F"), null, found.Number("f"));
                Figure p = new(estimator, "p", expected.Number("p"), null, found.Number("p"));
                Assert.True(f.Holds(Tolerance) && p.Holds(Tolerance), f.Describe() + "\n" + p.Describe());
            }

            Assert.Equal("hc3", exclusion.Text("basis"));
        });
    }

    /// <summary>The policy of the reference cases says classical; sampling weights leave no classical test to rest on.</summary>
    [Fact]
    public void No_classical_test_is_given() => Assert.All(CaseRuns.Of(Name).Case.Groups, group =>
    {
        JsonElement exclusion = Sampled.Exclusion(group.Text("group"));
        Assert.All(new[] { "classical", "last_in", "largest_model_denominator" }, test => Assert.Null(RecordView.Test(exclusion, test)));
        Assert.Null(Sampled.FinalFit.Number("f"));
        Assert.Null(Sampled.FinalFit.Number("log_likelihood"));
    });

    private static RecordView Audited()
    {
        string declaration = ReferenceFiles.ReadText($"{Name}/declaration.yaml");
        Assert.Contains("kind: precision", declaration, StringComparison.Ordinal);
        var record = AuditRunner.Record(
            declaration.Replace("kind: precision", "kind: sampling", StringComparison.Ordinal),
            file => File.OpenRead(ReferenceFiles.FullPath($"{Name}/{file}")),
            ReferenceFiles.ReadText("policy-reference.yaml"));
        return new RecordView(JsonDocument.Parse(Auditor.Reporting.JsonRecord.Write(record)).RootElement);
    }
}
