using Auditor.Numerics;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis.Parts;

/// <summary>Results in parts as the record shows them.</summary>
internal static class PartFigure
{
    /// <param name="rows">Rows of the group that lie in the part.</param>
    public static PartFigures Of(string label, int rows, RowSetFit? fit, GroupEvidence? evidence, PValue? adjusted, Policy policy)
    {
        if (fit is null || evidence is null)
        {
            var few = rows == 0
                ? "no row of the group's test lies in this part"
                : $"{PlainNumber.Count(rows)} {(rows == 1 ? "row" : "rows")} of the group's test {(rows == 1 ? "lies" : "lie")} in this part, fewer than the {PlainNumber.Count(policy.PartRows)} that the policy asks for (part_rows)";
            return new PartFigures(label, rows, null, null, null, null, new EffectFigures(null, null, null, null, null, few), few);
        }

        var (test, why) = Figure(evidence.Basis.Test, evidence.Basis.Ceiling);
        return new PartFigures(
            label,
            rows,
            evidence.Basis.Name,
            test,
            Shown(adjusted),
            Figure(evidence.Tests.Classical, null).Figures,
            evidence.Basis.CannotReject(policy.Significance) ? WithoutSize(evidence, CannotReject(evidence.Basis.Ceiling!, policy)) : Effect(evidence, why),
            evidence.Basis.CannotReject(policy.Significance) ? CannotReject(evidence.Basis.Ceiling!, policy) : why is null ? null : InPart(evidence, why));
    }

    public static DifferenceFigures Difference(DifferenceOfParts difference, PValue? adjusted, Policy policy)
    {
        var (test, why) = Figure(difference.Test, difference.Ceiling);
        return new DifferenceFigures(difference.Compared, difference.Basis, test, Shown(adjusted), Figure(difference.Classical, null).Figures,
            difference.CannotReject(policy.Significance) ? CannotReject(difference.Ceiling!, policy) : why);
    }

    public static DifferenceFigures NoDifference(int compared, string why) => new(compared, null, null, null, null, why);

    /// <summary>In a part a column may be constant that is not so elsewhere.</summary>
    private static string InPart(GroupEvidence evidence, string why) => evidence.Fit.Added.Rank == 0
        ? "in this part the group's columns are constant, or combinations of the final model's"
        : why;

    private static (TestFigures? Figures, string? Why) Figure(TestResult result, TestResult? ceiling)
    {
        var none = new Dictionary<string, string>(StringComparer.Ordinal);
        var figures = TestFigure.Of(result, "test", none);
        return (figures is null ? null : figures with { CeilingP = ceiling?.P }, none.GetValueOrDefault("test"));
    }

    private static string CannotReject(TestResult ceiling, Policy policy) =>
        $"the test cannot reach the level {PlainNumber.Digits(policy.Significance, 4)} here: as the effect grows without limit, it ends at {PlainNumber.PAgainst(ceiling.P!.Value, policy.Significance)}";

    private static EffectFigures WithoutSize(GroupEvidence evidence, string why) =>
        new(evidence.Tests.PartialRSquared, evidence.ClassicalInterval?.Lower, evidence.ClassicalInterval?.Upper, null, null, why);

    private static double? Shown(PValue? adjusted) => adjusted is { } p ? TestFigure.ShownP(p.P) : null;

    private static EffectFigures Effect(GroupEvidence evidence, string? why) => new(
        evidence.Tests.PartialRSquared,
        evidence.ClassicalInterval?.Lower,
        evidence.ClassicalInterval?.Upper,
        evidence.BasisInterval?.Lower,
        evidence.BasisInterval?.Upper,
        evidence.BasisInterval is not null ? null
            : why is not null ? InPart(evidence, why)
            : ImpedimentWords.Of((evidence.Basis.Unrestricted as NotComputable)?.Why ?? Impediment.SingularCovariance));
}
