using Auditor.Numerics.Distributions;

namespace Auditor.Numerics;

/// <summary>The result of one test: a statistic with its reference distribution, or the reason why there is none. Never a NaN.</summary>
public abstract record TestResult
{
    /// <summary>p, or null when there is none.</summary>
    public virtual double? P => null;

    public static TestResult None(Impediment why) => new NotComputable(why);

    /// <summary>An F statistic on (df1, df2), p the upper tail.</summary>
    public static TestResult F(double f, double df1, double df2) => double.IsFinite(f) && df1 > 0 && df2 > 0
        ? new FTest(f, df1, df2, FisherF.Survival(f, df1, df2), FisherF.LogSurvival(f, df1, df2))
        : new NotComputable(Impediment.NotFinite);
}

/// <param name="Statistic">F, at least 0.</param>
/// <param name="Df1">Numerator degrees of freedom.</param>
/// <param name="Df2">Denominator degrees of freedom, not always whole.</param>
/// <param name="Probability">Upper tail probability, 0 when it underflows.</param>
/// <param name="LogP">Its natural logarithm, finite when p underflows.</param>
public sealed record FTest(double Statistic, double Df1, double Df2, double Probability, double LogP) : TestResult
{
    public override double? P => Probability;
}

/// <summary>The larger model fits perfectly and the smaller one does not: F has no finite value, p is 0.</summary>
public sealed record PerfectWithGroup(double Df1, double Df2) : TestResult
{
    public override double? P => 0;
}

public sealed record NotComputable(Impediment Why) : TestResult;

/// <summary>Why a test or figure has no value.</summary>
public enum Impediment
{
    /// <summary>The group adds no direction to the model: df1 = 0.</summary>
    AddsNothing,

    /// <summary>No degrees of freedom are left: df2 = 0.</summary>
    NoResidualDegreesOfFreedom,

    /// <summary>The model without the group already fits to rounding.</summary>
    PerfectWithoutGroup,

    /// <summary>The model with the group fits to rounding, so residuals say nothing of their variance.</summary>
    PerfectWithGroup,

    /// <summary>With the group in, a row has leverage 1 that it had not before: the group holds that row's own dummy.</summary>
    RestsOnOneRow,

    /// <summary>The estimated covariance of the group's effects is singular.</summary>
    SingularCovariance,

    /// <summary>The null-imposed score form has no more contributing rows (clusters, periods) than tested directions.</summary>
    TooFewContributions,

    /// <summary>Fewer clusters bear on the group than a test of so many directions needs.</summary>
    TooFewClusters,

    /// <summary>More directions are tested than the form over periods has cosines for, or than periods bear on the group.</summary>
    TooFewPeriods,

    /// <summary>With the group in, some direction of it is fitted from one cluster alone: CR2 has no residual to judge it by.</summary>
    RestsOnOneCluster,

    /// <summary>More clusters, or larger matrices of them, than the form is computed for; CR1 stands in.</summary>
    TooManyClusters,

    /// <summary>So many clusters that resampling them adds nothing to the score form.</summary>
    ManyClusters,

    /// <summary>More periods than the form is computed for.</summary>
    TooManyPeriods,

    /// <summary>Sampling weights: the classical test does not apply.</summary>
    SamplingWeights,

    /// <summary>The statistic overflowed.</summary>
    NotFinite,

    /// <summary>There are no rows.</summary>
    NoRows,

    /// <summary>The effects of fewer than two parts of the rows can be told apart.</summary>
    NothingToCompare,

    /// <summary>Columns times parts are more directions than a comparison of parts is computed for.</summary>
    TooManyDirections,

    /// <summary>The stated rule of elimination does not end in the reported model.</summary>
    RuleEndsElsewhere,

    /// <summary>Whether the stated rule ends in the reported model is decided by rounding: two candidates are equal to the last digits.</summary>
    SelectionHangsOnRounding,
}
