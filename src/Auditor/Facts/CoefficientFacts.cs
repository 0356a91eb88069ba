using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of one coefficient of the final model.</summary>
public static class CoefficientFacts
{
    private static readonly FactFamily<CoefficientFigures> Family = new FactFamily<CoefficientFigures>(About.Coefficient)
        .Text("name", "Label of the coefficient.", coefficient => coefficient.Name)
        .Flag("estimable", "The data determine it.", coefficient => coefficient.Estimate is not null)
        .Number("estimate", FactUnits.None, "Its estimate.", coefficient => coefficient.Estimate, Why)
        .Number("standard_error", FactUnits.None, "Its classical standard error.", coefficient => coefficient.StandardError, Why)
        .Number("t", FactUnits.None, "estimate over standard_error.", coefficient => coefficient.T, Why)
        .Number("p", FactUnits.P, "Two-sided classical p.", coefficient => coefficient.P, Why)
        .Number("lower", FactUnits.None, "Lower limit of its interval at 1 - significance.", coefficient => coefficient.Lower, Why)
        .Number("upper", FactUnits.None, "Upper limit of its interval at 1 - significance.", coefficient => coefficient.Upper, Why)
        .Flag("interval_holds_zero", "Zero lies in that interval.",
            coefficient => coefficient is { Lower: double lower, Upper: double upper } ? lower <= 0 && upper >= 0 : null, Why);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    public static FactSet From(CoefficientFigures coefficient) => Family.From(coefficient, coefficient.Name, null);

    private static string Why(CoefficientFigures coefficient) => coefficient.Why ?? "the coefficient has no such value";
}
