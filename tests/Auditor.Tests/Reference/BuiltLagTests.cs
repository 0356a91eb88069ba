using Auditor.Reporting;
using Auditor.Results;

namespace Auditor.Tests.Reference;

/// <summary>
/// A reference case whose file holds lags as columns, declared anew with terms that build them from the series. The declaration over the file's own
/// columns is held against values from outside by the floors; the same numbers must come out here, to the last bit.
/// </summary>
public sealed class BuiltLagTests
{
    private const string Yaml = """
        audit: 1
        model: {id: us-consumption-lag}
        data:
          source: us_consumption_lag/data.csv
          time: year
        response: con
        final_model: {terms: [gnp, {lag: {of: gnp, by: 1}}]}
        left_out:
          - {group: lagged_consumption, terms: [{lag: {of: con, by: 1}}]}
          - {group: trend, terms: [year]}
        """;

    private static readonly AuditRecord _columns = AuditRunner.Record(
        ReferenceFiles.ReadText("us_consumption_lag/declaration.yaml"), _ => Open("us_consumption_lag/data.csv"), ReferenceFiles.ReadText("policy-reference.yaml"));

    [Theory]
    [InlineData("year")]
    [InlineData("{file_order: true}")]
    public void Lags_built_from_the_series_are_the_lags_of_the_file(string time)
    {
        var built = AuditRunner.Record(Yaml.Replace("time: year", "time: " + time, StringComparison.Ordinal), Open, ReferenceFiles.ReadText("policy-reference.yaml"));

        Assert.Equal(["intercept", "gnp", "lag(gnp, 1)"], built.FinalFit.Coefficients.Select(coefficient => coefficient.Name));
        Assert.Equal(_columns.FinalFit.Coefficients.Select(Figures), built.FinalFit.Coefficients.Select(Figures));
        Assert.Equal(_columns.Exclusions.Select(exclusion => exclusion.Tests.Classical), built.Exclusions.Select(exclusion => exclusion.Tests.Classical));
        Assert.Equal((20, 1, 19), (built.Rows.Read, built.Rows.Incomplete, built.Rows.Used));
    }

    /// <summary>The values of R (case.json), without the detour over the other declaration.</summary>
    [Fact]
    public void The_group_of_a_lag_has_the_F_of_the_reference()
    {
        var lag = AuditRunner.Record(Yaml, Open).Exclusions[0];
        var expected = ReferenceCases.Named("us_consumption_lag").Values.GetProperty("group_tests")[0];

        Assert.Equal(["lag(con, 1)"], lag.Terms);
        Assert.Equal(expected.GetProperty("F").GetDouble(), lag.Tests.Classical!.F!.Value, 1e-9 * expected.GetProperty("F").GetDouble());
    }

    /// <summary>The mean growth of a series from its changes: (last - first) / (n - 1), by arithmetic.</summary>
    [Fact]
    public void The_response_may_be_a_change()
    {
        var record = AuditRunner.Record(
            "audit: 1\nmodel: {id: growth}\ndata: {source: us_consumption_lag/data.csv, time: year}\nresponse: {change: {of: con, by: 1}}\nfinal_model: {terms: []}\nleft_out: [{group: g, terms: [{change: {of: gnp, by: 1}}]}]\n", Open);

        Assert.Equal("change(con, 1)", record.Model.Response);
        Assert.Equal(19, record.Rows.Used);
        Assert.Equal((951.6 - 522.67) / 19, record.FinalFit.Coefficients[0].Estimate!.Value, 1e-10);
    }

    private static Stream Open(string name) => File.OpenRead(ReferenceFiles.FullPath(name));

    private static (double?, double?, double?, double?) Figures(CoefficientFigures coefficient) =>
        (coefficient.Estimate, coefficient.StandardError, coefficient.T, coefficient.P);
}
