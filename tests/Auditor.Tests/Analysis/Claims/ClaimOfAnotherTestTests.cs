using Auditor.Findings;
using Auditor.Reporting.Html;
using Auditor.Results;

namespace Auditor.Tests.Analysis.Claims;

/// <summary>A p that the author computed by the classical test, where the verdict rests on another one that falls on the other side of the level.</summary>
public sealed class ClaimOfAnotherTestTests
{
    [Fact]
    public void A_classical_p_agrees_though_the_verdict_rests_on_another_test()
    {
        const string declaration = """
            audit: 1
            model: {id: claimed}
            data: {source: data.csv, time: year}
            response: con
            final_model: {terms: [gnp, gnp_lag1]}
            left_out:
              - group: lagged consumption
                terms: [con_lag1]
                reported: {p: 0.00011}
            """;
        var record = AuditRunner.Record(declaration, name => File.OpenRead(Path.Combine(TestFolders.Reference, "us_consumption_lag", name)), "significance: 0.001\n");
        var exclusion = Assert.Single(record.Exclusions);
        Assert.True(exclusion is { Basis: "time", P: > 0.001, Tests.Classical.P: < 0.001 });

        var claim = Assert.Single(record.Claims);
        Assert.True(claim is { Outcome: ClaimOutcomes.Agrees, ReproducedBy: null, OtherSideOfSignificance: false });
        Assert.DoesNotContain(record.Findings, finding => finding.Subject == claim.Claim && finding.Severity > Severity.Note);
        Assert.Equal("agrees; by the classical test", ClaimWords.Table(record, []).Rows[0][^1].Text);
    }
}
