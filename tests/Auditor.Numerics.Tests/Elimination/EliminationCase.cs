using Auditor.Numerics.Elimination;
using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Tests.Elimination;

/// <summary>A design with what an elimination needs of it: intercept and first final columns forced, every later final column and every group a unit.</summary>
internal sealed class EliminationCase
{
    /// <param name="forced">Leading columns of the final model (the intercept counts) that cannot be dropped.</param>
    public EliminationCase(IDesignRows design, int forced)
    {
        Final = FinalFactor.Of(FactorBuilder.Build(design));
        var layout = design.Layout;
        Candidates = new Candidates(
            [.. Enumerable.Range(0, forced)],
            [
                .. Enumerable.Range(forced, layout.FinalColumns - forced).Select(column => new CandidateUnit([column], LeftOut: false)),
                .. layout.Groups.Select(range => new CandidateUnit([.. range.Indices], LeftOut: true)),
            ],
            Final.Factor.Totals.N);
        Groups = [.. layout.Groups.Select(range => AddedGroup.Of(Final, [.. range.Indices]))];
    }

    public FinalFactor Final { get; }

    public Candidates Candidates { get; }

    public IReadOnlyList<AddedGroup> Groups { get; }

    public EliminationPath Path(DroppingRule rule) => new(Final, Candidates, rule);

    public TestResult Selective(int group, DroppingRule rule) => SelectiveP.Of(Groups[group], Candidates, rule, Path(rule));
}
