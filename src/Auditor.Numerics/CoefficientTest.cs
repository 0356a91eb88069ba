using Auditor.Numerics.Distributions;

namespace Auditor.Numerics;

/// <summary>Two-sided t test of one coefficient. Null: it is zero. t = estimate / standard error on n - r degrees of freedom.</summary>
/// <param name="P">Two-sided probability, 0 when it underflows.</param>
/// <param name="LogP">Its natural logarithm.</param>
/// <remarks>Verified against NIST StRD, R's lm and 100-digit arithmetic (tests/reference).</remarks>
public sealed record CoefficientTest(double T, double P, double LogP)
{
    public static CoefficientTest Of(double estimate, double standardError, double df)
    {
        var t = estimate / standardError;
        return new CoefficientTest(t, StudentT.TwoSided(t, df), StudentT.LogTwoSided(t, df));
    }
}
