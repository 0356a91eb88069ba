namespace Auditor.Tests.Analysis.Claims;

/// <summary>
/// Reported figures against each other. The first of each pair is a set that fits (longley, certified by NIST; R² 0.9955 with n = 16 and seven
/// coefficients), the second the same with one figure that no rounding can explain; limits by hand from the formulas.
/// </summary>
public sealed class RelationTests
{
    [Theory]
    [InlineData("rows_used: 16, r_squared: 0.9955, adjusted_r_squared: 0.9925", true)]
    [InlineData("rows_used: 16, r_squared: 0.9955, adjusted_r_squared: 0.9935", false)]
    [InlineData("r_squared: 0.9955, adjusted_r_squared: 0.9925", true)]
    [InlineData("r_squared: 0.9955, adjusted_r_squared: 0.9965", false)]
    [InlineData("rows_used: 16, r_squared: 0.9955, f: 330.3", true)]
    [InlineData("rows_used: 16, r_squared: 0.9955, f: 350.3", false)]
    [InlineData("rows_used: 16, adjusted_r_squared: 0.9925, f: 330.3", true)]
    [InlineData("rows_used: 16, adjusted_r_squared: 0.9925, f: 350.3", false)]
    [InlineData("rows_used: 16, coefficients: {year: {estimate: 1829, standard_error: 455, p: 0.003}}", true)]
    [InlineData("rows_used: 16, coefficients: {year: {estimate: 1829, standard_error: 455, p: 0.030}}", false)]
    [InlineData("rows_used: 16, coefficients: {year: {estimate: 1829, standard_error: 455, p: \"> 0.05\"}}", false)]
    [InlineData("coefficients: {year: {estimate: 0, standard_error: 0, p: 0.9}}", true)]
    [InlineData("r_squared: 1.2", false)]
    [InlineData("r_squared: 41.3", false)]
    [InlineData("coefficients: {year: {standard_error: -455}}", false)]
    public void A_contradiction_is_found_only_where_no_rounding_can_explain_it(string figures, bool consistent)
    {
        var record = Reported.Of("nist_longley", "-largest", $"reported: {{{figures}}}");
        Assert.NotEmpty(record.ClaimsAgainstEachOther);
        Assert.Equal(consistent, record.ClaimsAgainstEachOther.All(relation => relation.Consistent));
        Assert.Equal(!consistent, record.Findings.Any(finding => finding.Rule == "claims-contradict-each-other"));
    }

    [Theory]
    [InlineData("{f: 0.71, df: [2, 416], p: 0.49}", true)]
    [InlineData("{f: 0.71, df: [2, 416], p: 0.29}", false)]
    [InlineData("{f: 0.7, df: [2, 416], p: 0.52}", true)]
    [InlineData("{f: 0.70, df: [2, 416], p: 0.52}", false)]
    [InlineData("{df: [2, 416]}", true)]
    [InlineData("{df: [2, 417]}", false)]
    public void A_test_must_fit_its_own_degrees_of_freedom_and_the_rows(string test, bool consistent)
    {
        var record = Reported.Of("california_schools", "", "reported: {rows_used: 420}", declaration =>
            declaration.Replace("  - group: resources\n", $"  - group: resources\n    reported: {test}\n", StringComparison.Ordinal));
        Assert.Equal(consistent, record.ClaimsAgainstEachOther.All(relation => relation.Consistent));
    }
}
