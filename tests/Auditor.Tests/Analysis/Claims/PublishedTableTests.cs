using Auditor.Results;

namespace Auditor.Tests.Analysis.Claims;

/// <summary>
/// Published tables entered as an author would enter them: all figures agree, and with one digit wrong exactly that figure differs. Sources:
/// published_values of each case.json and tests/reference/SOURCES.md.
/// </summary>
public sealed class PublishedTableTests
{
    /// <summary>NIST StRD, Longley: the certified values as printed, to 15 digits.</summary>
    private const string Longley = """
        reported:
          rows_used: 16
          r_squared: 0.995479004577296
          residual_sd: 304.854073561965
          f: 330.285339234588
          coefficients:
            intercept: {estimate: -3482258.63459582, standard_error: 890420.383607373}
            gnp_deflator: {estimate: 15.0618722713733, standard_error: 84.9149257747669}
            gnp: {estimate: -0.358191792925910E-01, standard_error: 0.334910077722432E-01}
            unemployed: {estimate: -2.02022980381683, standard_error: 0.488399681651699}
            armed_forces: {estimate: -1.03322686717359, standard_error: 0.214274163161675}
            population: {estimate: -0.511041056535807E-01, standard_error: 0.226073200069370}
            year: {estimate: 1829.15146461355, standard_error: 455.478499142212}
        """;

    [Fact]
    public void Longley_as_certified_agrees()
    {
        var record = Reported.Of("nist_longley", "-largest", Longley);
        Assert.Equal(18, record.Claims.Count);
        Assert.Empty(Reported.Wrong(record));
        Assert.Equal(("classical", 7, 7), (record.StandardErrorsReproducedBy!.Covariance, record.StandardErrorsReproducedBy.Reproduced, record.StandardErrorsReproducedBy.Of));
        Assert.All(record.ClaimsAgainstEachOther, relation => Assert.True(relation.Consistent, relation.Why));
        Assert.DoesNotContain(record.Findings, finding => finding.Rule.StartsWith("claim", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("304.854073561965", "304.864073561965", "reported.residual_sd", ClaimOutcomes.Differs)]
    [InlineData("15.0618722713733", "15.1618722713733", "reported.coefficients[gnp_deflator].estimate", ClaimOutcomes.Differs)]
    [InlineData("estimate: 15.0618722713733", "estimate: 15.061873", "reported.coefficients[gnp_deflator].estimate", ClaimOutcomes.LastDigit)]
    [InlineData("0.226073200069370", "0.226173200069370", "reported.coefficients[population].standard_error", ClaimOutcomes.Differs)]
    [InlineData("rows_used: 16", "rows_used: 15", "reported.rows_used", ClaimOutcomes.Differs)]
    [InlineData("0.995479004577296", "99.6 %", "reported.r_squared", ClaimOutcomes.LastDigit)]
    public void One_wrong_digit_is_the_one_figure_found(string right, string wrong, string path, string outcome)
    {
        var record = Reported.Of("nist_longley", "-largest", Longley.Replace(right, wrong, StringComparison.Ordinal));
        Assert.Equal((path, outcome), Assert.Single(record.Claims.Where(claim => claim.Outcome != ClaimOutcomes.Agrees).Select(claim => (claim.Claim, claim.Outcome))));
        Assert.Equal([path], record.Findings.Where(finding => finding.Rule is "claim-differs" or "claim-last-digit").Select(finding => finding.Subject));
    }

    [Fact]
    public void A_reversed_sign_is_a_high_finding()
    {
        var record = Reported.Of("nist_longley", "-largest", Longley.Replace("estimate: -2.02022980381683", "estimate: 2.02022980381683", StringComparison.Ordinal));
        Assert.Equal("reported.coefficients[unemployed].estimate", Assert.Single(record.Findings, finding => finding.Rule == "claim-other-sign").Subject);
    }

    [Fact]
    public void A_label_that_is_not_in_the_model_is_named_with_the_nearest()
    {
        var record = Reported.Of("nist_longley", "-largest", Longley.Replace("gnp_deflator:", "gnp_defaltor:", StringComparison.Ordinal));
        var claim = Reported.Claim(record, "reported.coefficients[gnp_defaltor].estimate");
        Assert.Equal((ClaimOutcomes.CannotBeRecomputed, "the final model has no coefficient of that label (did you mean 'gnp_deflator'?)"), (claim.Outcome, claim.Why));
        Assert.Equal(2, record.Findings.Count(finding => finding.Rule == "claim-not-recomputed"));
    }

    /// <summary>NIST StRD, Norris and NoInt1 (no intercept) as certified.</summary>
    [Theory]
    [InlineData("nist_norris", "reported: {rows_used: 36, r_squared: 0.999993745883712, residual_sd: 0.884796396144373, f: 5436385.54079785, coefficients: {intercept: {estimate: -0.262323073774029, standard_error: 0.232818234301152}, x: {estimate: 1.00211681802045, standard_error: 0.429796848199937E-03, p: 0.000}}}")]
    [InlineData("nist_noint1", "reported: {rows_used: 11, r_squared: 0.999365492298663, residual_sd: 3.56753034006338, f: 15750.25, coefficients: {x: {estimate: 2.07438016528926, standard_error: 0.165289256198347E-01, p: \"< 0.001\"}}}")]
    public void Certified_lines_agree(string name, string reported)
    {
        var record = Reported.Of(name, "", reported);
        Assert.Empty(Reported.Wrong(record));
        Assert.All(record.ClaimsAgainstEachOther, relation => Assert.True(relation.Consistent, relation.Why));
    }

    /// <summary>Tests of left-out groups as printed: the classical form, a robust one, and one within the largest model. Sources: see the class.</summary>
    [Theory]
    [InlineData("california_schools", "resources", "{f: 8.0101, df: [2, 416], p: 0.000386}", null)]
    [InlineData("california_schools", "resources", "{f: 5.4337, df: [2, 416], p: 0.004682}", "hc1")]
    [InlineData("public_schools", "curvature", "{f: 9.35, df: [1, 47], p: 0.0037}", null)]
    [InlineData("us_consumption_lag", "lagged_consumption", "{f: 27.093, p: 0.0001067}", null)]
    [InlineData("us_consumption_lag", "lagged_consumption", "{f: 9.7456, p: 0.006998}", "hc3")]
    [InlineData("swiss_fertility", "farming", "{f: 5.99, p: 0.0187}", "last_in")]
    [InlineData("swiss_fertility", "infant_mortality", "{f: 7.96, p: 0.0073}", "last_in")]
    public void A_printed_group_test_agrees_with_the_form_it_is(string name, string group, string reported, string? form)
    {
        var record = Reported.Of(name, "", "", declaration => WithGroupTest(declaration, group, reported));
        Assert.NotEmpty(record.Claims);
        Assert.Empty(Reported.Wrong(record));
        Assert.All(record.Claims, claim => Assert.Equal(form, claim.ReproducedBy));
        Assert.Equal(form is not null, record.Findings.Any(finding => finding.Rule == "claim-in-other-form"));
    }

    [Fact]
    public void A_p_printed_on_the_other_side_of_the_level_is_a_high_finding()
    {
        var record = Reported.Of("california_schools", "", "", declaration => WithGroupTest(declaration, "resources", "{f: 8.0101, df: [2, 416], p: 0.386}"));
        Assert.Equal("left_out[resources].reported.p", Assert.Single(record.Findings, finding => finding.Rule == "claim-p-on-other-side").Subject);
        Assert.Equal("left_out[resources].reported.p", Assert.Single(record.Findings, finding => finding.Rule == "claims-contradict-each-other").Subject);
    }

    private static string WithGroupTest(string declaration, string group, string reported)
    {
        string head = $"  - group: {group}\n";
        Assert.Contains(head, declaration, StringComparison.Ordinal);
        return declaration.Replace(head, head + $"    reported: {reported}\n", StringComparison.Ordinal);
    }
}
