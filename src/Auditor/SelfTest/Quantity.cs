using System.Globalization;

namespace Auditor.SelfTest;

/// <summary>A number to compare; a p-value that underflows is held by its decimal logarithm.</summary>
internal readonly record struct Quantity(double Number, double? Log10 = null)
{
    /// <summary>Below this a p-value is compared by its logarithm.</summary>
    private const double Underflow = 1e-290;

    /// <summary>Reads a decimal string of any exponent.</summary>
    public static Quantity Parse(string text)
    {
        double number = double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
        int e = text.IndexOfAny(['e', 'E']);
        return Math.Abs(number) < Underflow && e >= 0 ? new Quantity(number, LogOf(text, e)) : new Quantity(number);
    }

    /// <summary>
    /// Correct decimal digits of <paramref name="actual"/> where this is the true value: minus the logarithm of the difference relative to the
    /// larger of the true value and <paramref name="scale"/>; 16 at most.
    /// </summary>
    public double DigitsIn(Quantity actual, double scale)
    {
        bool byLogarithm = IsComparedByLogarithm(actual);
        double truth = byLogarithm ? Log10!.Value : Number;
        double found = byLogarithm ? actual.Log10!.Value : actual.Number;
        double difference = Math.Abs(truth - found);
        return difference == 0 ? 16 : Math.Min(16, -Math.Log10(difference / Math.Max(Math.Max(Math.Abs(truth), scale), Underflow)));
    }

    public bool IsComparedByLogarithm(Quantity actual) => Math.Abs(Number) < Underflow && Log10 is not null && actual.Log10 is not null;

    public override string ToString() =>
        string.Create(CultureInfo.InvariantCulture, $"{Number:R}") + (Log10 is { } log ? string.Create(CultureInfo.InvariantCulture, $" (log10 {log:R})") : "");

    private static double LogOf(string text, int e) =>
        Math.Log10(double.Parse(text.AsSpan(0, e), NumberStyles.Float, CultureInfo.InvariantCulture))
        + int.Parse(text.AsSpan(e + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
}
