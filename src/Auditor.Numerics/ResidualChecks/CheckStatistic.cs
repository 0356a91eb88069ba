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

    /// <summary>Samples drawn for <see cref="SimulatedP"/>, null without it.</summary>
    public int? Draws { get; init; }

    /// <summary>p is at most <see cref="P"/>: its formula ends there.</summary>
    public bool PIsUpperBound { get; init; }

    /// <summary>0-based position of the row that the check is about, null when it is about all.</summary>
    public int? Position { get; init; }

    /// <summary>The check's auxiliary regression was too wide and rests on the fitted value and its square.</summary>
    public bool OnFittedValues { get; init; }
}

/// <summary>With what the check adds (powers, a row's own dummy) the model fits to rounding, without it it does not: the statistic has no finite value, p is 0.</summary>
/// <param name="Position">As <see cref="CheckStatistic.Position"/>.</param>
public sealed record UnboundedCheck(double Df, double? Df2, int? Position) : CheckOutcome;

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

    /// <summary>Sampling weights: the check's reference distribution does not apply.</summary>
    SamplingWeights,
}
