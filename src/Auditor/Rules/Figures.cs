using Auditor.Facts;

namespace Auditor.Rules;

/// <summary>Values as messages show them: the same digits as on the page, never a p of 0, the same in every culture.</summary>
internal static class Figures
{
    private const double SoManyThatFractionsSayNothing = 100;
    private const int SettingDigits = 6;
    private const int ShortDigits = 3;

    /// <param name="level">What a p is compared with: it must not seem to be on the other side.</param>
    public static string Shown(FactValue value, string unit, double level) => value switch
    {
        FactValue.Count count => PlainNumber.Count(count.Value),
        FactValue.Number number => Shown(number.Value, unit, level),
        FactValue.Text text => text.Value,
        FactValue.Flag flag => flag.Value ? "true" : "false",
        _ => "not computed",
    };

    /// <summary>A value of the policy, or one in a rule: as written there.</summary>
    public static string Setting(FactValue value) => value is FactValue.Number number ? PlainNumber.Digits(number.Value, SettingDigits) : Shown(value, FactUnits.None, 1);

    /// <summary>A value of the policy in a message.</summary>
    public static string SettingInWords(FactValue value) => Setting(value) switch
    {
        "holm" => "Holm",
        "own" => "own rows",
        "common" => "common rows",
        var words => words.Replace('_', ' '),
    };

    /// <summary>A share of the policy as a percentage.</summary>
    public static string SettingAsPercent(FactValue value) => value is FactValue.Number number ? Percent(number.Value) : Setting(value);

    private static string Shown(double value, string unit, double level) => unit switch
    {
        FactUnits.P => PlainNumber.Probability(value, null, level),
        FactUnits.Share => Percent(value),
        FactUnits.PartialRSquared or FactUnits.Probability => PlainNumber.Share(value),
        FactUnits.DegreesOfFreedom => PlainNumber.Count(value),
        FactUnits.Digits or FactUnits.Clusters => PlainNumber.Digits(value, ShortDigits),
        FactUnits.Rows when value >= SoManyThatFractionsSayNothing => PlainNumber.Whole(value),
        FactUnits.Rows => PlainNumber.Digits(value, ShortDigits),
        _ => PlainNumber.Number(value),
    };

    private static string Percent(double share) => PlainNumber.Digits(100 * share, ShortDigits) + " %";
}
