using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>
/// Correct digits against the values certified by NIST, columns as they stand in the file and, for polynomials, with the powers formed by the tool.
/// The digits asked for here are the least; floors.json may ask for more.
/// </summary>
public sealed class CertifiedTests
{
    public static TheoryData<string, string, double> Certified => new()
    {
        { "nist_norris", "", 9 },
        { "nist_norris", "-powers", 9 },
        { "nist_noint1", "", 9 },
        { "nist_noint1", "-powers", 9 },
        { "nist_longley", "-largest", 9 },
        { "nist_wampler1", "-largest", 9 },
        { "nist_wampler1", "-largest-powers", 9 },
        { "nist_wampler4", "-largest", 9 },
        { "nist_wampler4", "-largest-powers", 9 },

        // Rounding x^k to double in the file leaves 7.6 digits at most.
        { "nist_filip", "-largest", 7 },
        { "nist_filip", "-largest-powers", 7 },
    };

    [Theory]
    [MemberData(nameof(Certified))]
    public void Certified_values_are_met(string name, string variant, double digits)
    {
        IReadOnlyList<Figure> figures = [.. CertifiedFigures.Of(CaseRuns.Of(name, variant))];
        Assert.NotEmpty(figures);
        Assert.All(figures, figure => Assert.True(figure.CorrectDigits >= digits, figure.Describe()));
    }

    [Theory]
    [InlineData("-largest")]
    [InlineData("-largest-powers")]
    public void A_perfect_fit_leaves_only_rounding(string variant)
    {
        CaseRun run = CaseRuns.Of("nist_wampler1", variant);
        double withFewerTerms = run.Case.Values.GetProperty("final_model").Number("rss")!.Value.Number;
        Assert.InRange(run.Record.FinalFit.Number("rss")!.Value.Number / withFewerTerms, 0, 1e-18);
    }
}
