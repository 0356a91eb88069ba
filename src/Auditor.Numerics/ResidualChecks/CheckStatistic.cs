using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>The result of a residual check: a statistic with its p, or the reason why there is none.</summary>
public abstract record CheckOutcome
{
    public static CheckOutcome None(CheckImpediment why) => new NoCheck(why);
}

/// <param name="Df">Degrees of freedom, null when the reference distribution has none.</param>
/// <param name="Df2">Denominator degrees of freedom of an F, else null.</param>
/// <param name="P">Probability, under the null, of a statistic at least as far out in the direction that speaks against the null.</param>
public sealed record CheckStatistic(double Statistic, double? Df, double? Df2, double P) : CheckOutcome
{
    /// <summary>Natural logarithm of p where it can be given beyond underflow; null otherwise.</summary>
    public double? LogP { get; init; }

    /// <summary>p by simulation, where the approximation is not trusted; null otherwise.</summary>
    public double? SimulatedP { get; init; }

    /// <summary>Samples drawn for <see cref="SimulatedP"/>, null without it.</summary>
    public int? Draws { get; init; }

    /// <summary>p is at most <see cref="P"/>: its formula ends there.</summary>
    public bool PIsUpperBound { get; init; }

    /// <summary>0-based position of the row that the check is about, null when it is about all.</summary>
    public int? Position { get; init; }

    /// <summary>The check's auxiliary regression was too wide and rests on the fitted value and its square.</summary>
    public bool OnFittedValues { get; init; }

    /// <summary>p by the normal law, because there are too many rows for the exact one.</summary>
    public bool NormalApproximation { get; init; }

    /// <summary>A part has too few rows for coefficients of its own: the test asks whether the other part's fit predicts them.</summary>
    public bool Predictive { get; init; }

    /// <summary>How many units the check runs within, where there is more than one; else null.</summary>
    public int? WithinUnits { get; init; }

    /// <summary>How many lagged changes the check's regression holds; null where it has none to choose.</summary>
    public int? Lags { get; init; }

    /// <summary>How large what the check looks for is, whatever the number of rows: in a large sample p alone makes much of little.</summary>
    public IReadOnlyList<CheckSize> Sizes { get; init; } = [];
}

/// <summary>A size that does not grow with the number of rows.</summary>
public readonly record struct CheckSize(SizeMeasure Measure, double Value);

public enum SizeMeasure
{
    /// <summary>R² of the check's auxiliary regression.</summary>
    AuxiliaryRSquared,

    /// <summary>Share of the residual sum of squares that what the check adds to the model takes away.</summary>
    PartialRSquared,

    /// <summary>Moment skewness of the residuals.</summary>
    Skewness,

    /// <summary>Moment kurtosis of the residuals less 3.</summary>
    ExcessKurtosis,

    /// <summary>How straight the normal quantile plot is: W, about the squared correlation in it; 1 is straight.</summary>
    NormalPlotRSquared,

    /// <summary>A²/n: squared distance between the residuals' distribution and the normal, weighted towards the tails.</summary>
    DistanceFromNormal,

    /// <summary>Autocorrelation of neighbouring residuals.</summary>
    FirstAutocorrelation,

    /// <summary>The autocorrelation that is farthest from 0, with its sign.</summary>
    LargestAutocorrelation,

    /// <summary>The share of a residual that is still there one period later; 1 under a unit root.</summary>
    Persistence,
}

/// <summary>With what the check adds (powers, a row's own dummy) the model fits to rounding, without it it does not: the statistic has no finite value, p is 0.</summary>
/// <param name="Position">As <see cref="CheckStatistic.Position"/>.</param>
public sealed record UnboundedCheck(double Df, double? Df2, int? Position) : CheckOutcome;

public sealed record NoCheck(CheckImpediment Why) : CheckOutcome;

/// <summary>Checks whose statistic is chi-square under the null.</summary>
internal static class ChiSquaredCheck
{
    public static CheckStatistic Of(double statistic, double df, params IReadOnlyList<CheckSize> sizes) =>
        new(statistic, df, null, ChiSquared.Survival(statistic, df)) { LogP = ChiSquared.LogSurvival(statistic, df), Sizes = sizes };
}

/// <summary>Why a check has no value.</summary>
public enum CheckImpediment
{
    /// <summary>The residuals are rounding, or no degrees of freedom are left.</summary>
    NoResiduals,

    /// <summary>Too few observations for the check.</summary>
    TooFew,

    /// <summary>More observations than the check is defined for.</summary>
    TooMany,

    /// <summary>The auxiliary regression has no column beside its intercept, or the fitted value is constant.</summary>
    NothingToRelate,

    /// <summary>The auxiliary regression has as many columns as there are observations.</summary>
    Saturated,

    /// <summary>All residuals have the same size, so there is no variance to explain.</summary>
    EqualSquares,

    /// <summary>All residuals are equal: they have no distribution to look at.</summary>
    EqualResiduals,

    /// <summary>The powers of the fitted value are combinations of the model's columns and of each other.</summary>
    PowersAddNothing,

    /// <summary>Rows that stand for several have no order among these.</summary>
    FrequencyWeights,

    /// <summary>A lag of the response stands among the terms: the check's reference distribution does not hold.</summary>
    LaggedResponse,

    /// <summary>The check is for one series and there are several.</summary>
    SeveralSeries,

    /// <summary>The check is for a series without gaps.</summary>
    Gaps,

    /// <summary>No critical values are published for so many columns, or for a model without an intercept.</summary>
    NoCriticalValues,

    /// <summary>One part of the split has no rows, or nothing of its own to estimate.</summary>
    EmptyPart,

    /// <summary>Sampling weights: the check's reference distribution does not apply.</summary>
    SamplingWeights,
}
