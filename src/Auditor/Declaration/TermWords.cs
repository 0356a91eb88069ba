using System.Globalization;

namespace Auditor.Declaration;

/// <summary>The words and numbers of labels.</summary>
internal static class TermWords
{
    public static string Name(NumberTransform transform) => transform switch
    {
        NumberTransform.Log => "log",
        NumberTransform.Log10 => "log10",
        NumberTransform.Log1p => "log1p",
        NumberTransform.Sqrt => "sqrt",
        NumberTransform.Square => "square",
        NumberTransform.Inverse => "inverse",
        NumberTransform.Exp => "exp",
        NumberTransform.Abs => "abs",
        _ => "center",
    };

    public static string Name(TimeOrderOperation operation) => operation switch
    {
        TimeOrderOperation.Lag => "lag",
        TimeOrderOperation.Change => "change",
        _ => "moving_average",
    };

    public static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    public static string Limit(double? value) => value is double limit ? Number(limit) : "none";

    public static string Sum(Term term, double plus) =>
        plus < 0 ? Summand(term) + " - " + Number(-plus) : Summand(term) + " + " + Number(plus);

    /// <summary>What is added to a value or date would read as belonging to it.</summary>
    private static string Summand(Term term) => term is IndicatorTerm or StepTerm or PulseTerm ? term.Operand : term.Label;
}
