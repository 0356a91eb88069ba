using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>The result of a residual check: a statistic with its p, or the reason why there is none.</summary>
public abstract record CheckOutcome
{
    public static CheckOutcome None(CheckImpediment why) => new NoCheck(why);
}

/// <param name="Df">Degrees of freedom, null when the reference distribution has none.</param>
/// <param name="Df2">Denominator degrees of freedom of an F, else null.</param>
/// <param name="P">Upper tail probability under the null.</param>
public sealed record CheckStatistic(double Statistic, double? Df, double? Df2, double P) : CheckOutcome
{
    /// <summary>Natural logarithm of p where it can be given beyond underflow; null otherwise.</summary>
    public double? LogP { get; init; }

    /// <summary>p by simulation, where the approximation is not trusted; null otherwise.</summary>
    public double? SimulatedP { get; init; }

    /// <summary>0-based position of the row that the check is about, null when it is about all.</summary>
    public int? Position { get; init; }

    /// <summary>The check's auxiliary regression was too wide and rests on the fitted value and its square.</summary>
    public bool OnFittedValues { get; init; }
}

public sealed record NoCheck(CheckImpediment Why) : CheckOutcome;

/// <summary>Checks whose statistic is chi-square under the null.</summary>
internal static class ChiSquaredCheck
{
    public static CheckStatistic Of(double statistic, double df) =>
        new(statistic, df, null, ChiSquared.Survival(statistic, df)) { LogP = ChiSquared.LogSurvival(statistic, df) };
}

/// <summary>Why a check has no value.</summary>
public enum CheckImpediment
{
    /// <summary>The residuals are rounding, or no degrees of freedom are left.</summary>
    NoResiduals,

    /// <summary>All residuals are equal.</summary>
    ResidualsDoNotVary,

    /// <summary>Without one of the rows the model fits to rounding: its residual has no finite studentised value.</summary>
    PerfectWithoutOneRow,

    /// <summary>Too few observations for the check.</summary>
    TooFew,

    /// <summary>More observations than the check is defined for.</summary>
    TooMany,

    /// <summary>The auxiliary regression has no column beside its intercept.</summary>
    NothingToRelate,

    /// <summary>Sampling weights: the check's reference distribution does not apply.</summary>
    SamplingWeights,
}
