using Auditor.Numerics.Factor;

namespace Auditor.Numerics.Elimination;

/// <summary>
/// What a stated rule of backward elimination does with the observed response, from the largest model on: which units it drops, in which order, on which
/// figures, and what it keeps.
/// </summary>
/// <remarks>The test of each step is the partial F of <see cref="GroupTests.PartialF"/> in that step's model. Compared with R's step and with refits in the tests.</remarks>
public sealed class EliminationPath
{
    private static readonly double[] Observed = [1];

    private readonly Submodels _submodels;
    private readonly FinalFactor _final;
    private readonly DroppingRule _rule;

    public EliminationPath(FinalFactor final, Candidates candidates, DroppingRule rule)
    {
        (_final, _rule) = (final, rule);
        var factor = final.Factor;
        _submodels = new Submodels(factor, candidates, factor.R.Select([factor.Layout.Response]));
        Impediment = OfLargest();
        var (drops, set) = (new List<UnitDrop>(), candidates.All);
        while (Impediment is null && _rule.Next(_submodels[set], candidates, Observed) is int unit)
        {
            drops.Add(Removal(set, unit));
            set = set.Without(unit);
        }

        (Drops, Kept) = (drops, set);
    }

    /// <summary>Why no path can be taken: the largest model leaves no degrees of freedom, or fits to rounding.</summary>
    public Impediment? Impediment { get; }

    /// <summary>In the rule's order.</summary>
    public IReadOnlyList<UnitDrop> Drops { get; }

    /// <summary>The units that the rule keeps.</summary>
    public UnitSet Kept { get; }

    public bool EndsInReported => Impediment is null && Kept == _submodels.Candidates.Reported;

    /// <summary>What the rule has to go by when the unit is to leave the model of this set.</summary>
    public UnitDrop Removal(UnitSet set, int unit)
    {
        var model = _submodels[set];
        var added = model.Added[unit]!;
        var (sum, rss, df2) = (added.SumOfSquares.At(Observed), model.Residual.At(Observed), _submodels.Candidates.Observations - model.Rank);
        var test = added.Rank == 0 ? TestResult.None(Numerics.Impediment.AddsNothing)
            : df2 <= 0 ? TestResult.None(Numerics.Impediment.NoResidualDegreesOfFreedom)
            : PerfectFit.Is(_final, rss) ? TestResult.None(Numerics.Impediment.PerfectWithGroup)
            : TestResult.F(sum / added.Rank / (rss / df2), added.Rank, df2);
        var change = _rule.Criterion == DroppingCriterion.PartialF || test is not FTest
            ? (double?)null
            : _rule.Change(sum, added.Rank, rss, _submodels.Candidates.Observations);
        return new UnitDrop(unit, test, change);
    }

    /// <summary>The unit that the rule would drop next among those that can be tested; null when it would stop.</summary>
    public int? NextTested(UnitSet set) => _rule.Tested(_submodels[set], _submodels.Candidates, Observed);

    private Impediment? OfLargest()
    {
        var largest = _submodels[_submodels.Candidates.All];
        return _submodels.Candidates.Observations <= largest.Rank ? Numerics.Impediment.NoResidualDegreesOfFreedom
            : PerfectFit.Is(_final, largest.Residual.At(Observed)) ? Numerics.Impediment.PerfectWithGroup
            : null;
    }
}

/// <summary>One unit dropped.</summary>
/// <param name="Test">Its partial F in that step's model.</param>
/// <param name="CriterionChange">What AIC or BIC changes by (below 0: lowered); null under a rule by p, and where the unit adds nothing.</param>
public sealed record UnitDrop(int Unit, TestResult Test, double? CriterionChange);
