using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>The final model on a row set that the author may have used.</summary>
/// <param name="Other">Not the fit that is shown.</param>
internal sealed record ClaimedRows(RowSetFit Fit, FitSummary Summary, bool Sampling, bool Other)
{
    /// <summary>Digits to which a coefficient and its standard error can be trusted.</summary>
    public double Digits => Math.Min(Fit.Fit.TrustworthyDigits, FitDigits);

    /// <summary>Digits to which figures of the fit as a whole are compared at most: more than any report prints, fewer than rounding may spoil.</summary>
    public const double FitDigits = 12;

    public CoefficientFigures? Coefficient(string label) => Summary.Coefficients.FirstOrDefault(one => one.Name == label);
}
