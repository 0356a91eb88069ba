using Auditor.Facts;

namespace Auditor.Rules;

/// <summary>Values as messages show them: few digits, never a p of 0, the same in every culture.</summary>
internal static class Figures
{
    private const double SoManyThatFractionsSayNothing = 100;

    public static string Shown(FactValue value, string unit) => value switch
    {
        FactValue.Count count => PlainNumber.Count(count.Value),
        FactValue.Number number when unit == FactUnits.P => PlainNumber.P(number.Value),
        FactValue.Number number when unit == FactUnits.Share => PlainNumber.Digits(100 * number.Value, 3) + " %",
        FactValue.Number number when unit == FactUnits.Rows && number.Value >= SoManyThatFractionsSayNothing => PlainNumber.Count(number.Value),
        FactValue.Number number => PlainNumber.Digits(number.Value, 4),
        FactValue.Text text => text.Value,
        FactValue.Flag flag => flag.Value ? "true" : "false",
        _ => "not computed",
    };
}
