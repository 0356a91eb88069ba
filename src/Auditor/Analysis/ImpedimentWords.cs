using Auditor.Numerics;

namespace Auditor.Analysis;

/// <summary>Why something has no value, in words.</summary>
internal static class ImpedimentWords
{
    public static string Of(Impediment impediment) => impediment switch
    {
        Impediment.AddsNothing => "the group adds no direction to the final model (df1 = 0): its columns are combinations of the final model's",
        Impediment.NoResidualDegreesOfFreedom => "no residual degrees of freedom are left with the group in (df2 = 0)",
        Impediment.PerfectWithoutGroup => "the final model already fits these rows to rounding, so nothing is left to test",
        Impediment.PerfectWithGroup => "with the group in, the model fits these rows to rounding and its residuals carry no information",
        Impediment.RestsOnOneRow => "the group rests on one row: with it in, that row has leverage 1",
        Impediment.SingularCovariance => "the estimated covariance of the group's effects is singular",
        Impediment.TooFewContributions => "too few rows contribute to the score for the directions tested",
        Impediment.TooFewClusters => "too few clusters bear on the group for the directions tested",
        Impediment.TooFewPeriods => "more directions are tested than the periods allow",
        Impediment.RestsOnOneCluster => "a direction of the group rests on one cluster: with it in, that cluster has no residual left for it",
        Impediment.TooManyClusters => "more clusters than this form is computed for",
        Impediment.ManyClusters => "with more than 100 clusters the form by clusters needs no resampling beside it",
        Impediment.TooManyPeriods => "more periods than this form is computed for",
        Impediment.SamplingWeights => "sampling weights: a classical test does not apply",
        Impediment.NoRows => "no row is complete for the final model and the group",
        Impediment.NothingToCompare => "in fewer than two parts can the group's effect be told apart",
        Impediment.TooManyDirections => "columns times parts are more directions than the comparison is computed for",
        Impediment.RuleEndsElsewhere => "the stated rule, replayed from all candidates, does not end in the reported model",
        Impediment.SelectionHangsOnRounding => "two candidates are equal to the last digits, so rounding decides where the stated rule ends",
        _ => "the statistic is not finite",
    };
}
