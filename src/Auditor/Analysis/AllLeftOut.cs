using Auditor.Design;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>All left-out terms as one group on the common rows: shown, never counted, a family of its own.</summary>
internal static class AllLeftOut
{
    public const string Name = "all left out";

    private const string Selective = "it is computed for one group at a time: the rule dropped them one by one";

    public static Exclusion? Of(BoundModel model, RowSetFit? common, JudgementInputs inputs)
    {
        var (policy, sampling, drifts) = inputs;
        if (model.Groups.Count == 0)
        {
            return null;
        }

        var evidence = common?.Joint is { } joint ? new GroupEvidence(new GroupResults(joint, policy.BasisWithoutStructure, sampling), policy) : null;
        var group = new JudgedGroup(evidence, ProductsElsewhere.OfAll(model) is [var product, ..] ? product : null)
        {
            Drifts = drifts && model.Groups.Any(left => left.Terms.Any(term => SerialBinding.MayDrift(term.Term))),
        };
        var judgement = Judgement.OfFamily([group], policy)[0];
        var terms = model.Groups.SelectMany(group => group.Terms).Select(term => term.Term.Label);
        var identity = new GroupIdentity(Name, [.. terms], null, null);
        return ExclusionFigures.Of(identity, judgement, common, null, common?.Joint, new SelectiveFigures(null, Selective), policy, sampling);
    }
}
