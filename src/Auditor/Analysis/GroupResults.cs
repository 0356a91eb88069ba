using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>All tests of one group on one row set. No level and no bound enters.</summary>
internal sealed class GroupResults
{
    public GroupResults(GroupFit fit, BasisWithoutStructure policy, bool sampling)
    {
        Fit = fit;
        var partial = PartialF.Of(fit.Added);
        Classical = sampling && partial is not NotComputable ? TestResult.None(Impediment.SamplingWeights) : partial;
        Hc = [.. Enum.GetValues<Heteroskedastic>().Select(estimator => WaldF.Of(fit.Added, fit.Sums, estimator))];
        Score = ScoreF.Of(fit.Added, fit.Sums);
        Ceiling = ScoreF.Ceiling(fit.Added, fit.Sums);
        Dependence = new DependenceResults(fit);
        Basis = Basis.Of(this, policy, sampling);
    }

    public GroupFit Fit { get; }

    public TestResult Classical { get; }

    /// <summary>HC0 to HC3, in that order.</summary>
    public IReadOnlyList<TestResult> Hc { get; }

    public TestResult Score { get; }

    public TestResult Ceiling { get; }

    public TestResult Hc3 => Hc[(int)Heteroskedastic.Hc3];

    public DependenceResults Dependence { get; }

    public Basis Basis { get; }

    /// <summary>Share of the residual sum of squares that the group takes out; null when nothing is left to take.</summary>
    public double? PartialRSquared =>
        Classical is NotComputable { Why: not Impediment.SamplingWeights } || Fit.Added.RssWithout <= 0
            ? null
            : Fit.Added.SumOfSquares / Fit.Added.RssWithout;
}
