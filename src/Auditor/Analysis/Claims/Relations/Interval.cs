using Auditor.Declaration;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>All numbers that a printed figure can stand for, or that follow from others; ends included.</summary>
internal readonly record struct Interval(double Low, double High)
{
    private const int Digits = 5;

    /// <summary>Widening of what was computed, so that rounding in our own arithmetic never makes a contradiction.</summary>
    private const double Rounding = 1e-9;

    /// <param name="least">Least value the figure can have.</param>
    /// <param name="most">Largest value it can have.</param>
    public static Interval Of(PrintedNumber printed, double least, double most)
    {
        var (low, high) = printed.Relation switch
        {
            PrintedRelation.Below or PrintedRelation.AtMost => (least, printed.Value),
            PrintedRelation.Above or PrintedRelation.AtLeast => (printed.Value, most),
            _ => (printed.Lower, printed.Upper),
        };
        return new Interval(Math.Max(low, least), Math.Min(high, most));
    }

    public bool Meets(Interval other) => Low - Slack(Low) <= other.High && other.Low <= High + Slack(High);

    /// <summary>The image under a function that only rises.</summary>
    public Interval Rising(Func<double, double> function) => new(function(Low), function(High));

    public override string ToString() =>
        double.IsPositiveInfinity(High) ? $"at least {Text(Low)}" : double.IsNegativeInfinity(Low) ? $"at most {Text(High)}" : $"from {Text(Low)} to {Text(High)}";

    private static double Slack(double value) => double.IsFinite(value) ? Math.Abs(value) * Rounding : 0;

    private static string Text(double value) => PlainNumber.Digits(value, Digits);
}
