using System.Globalization;

namespace Auditor.SelfTest;

/// <summary>One number of the record beside what it should be.</summary>
/// <param name="Kind">What is compared, over all rows of the same kind: <c>coefficient estimate</c>, <c>hc3 f</c>.</param>
/// <param name="Where">Which one: a coefficient, a group.</param>
/// <param name="Expected">From case.json (double precision); null when only <paramref name="Exact"/> is known.</param>
/// <param name="Exact">From exact.json (100 digits); null when it does not hold the number.</param>
/// <param name="Actual">From the record; null when the record has null there.</param>
/// <param name="Scale">Differences are relative to the larger of the value and this.</param>
internal sealed record Figure(string Kind, string Where, Quantity? Expected, Quantity? Exact, Quantity? Actual, double Scale = 0)
{
    /// <summary>The number does not exist, so the record must have null.</summary>
    public bool MustBeAbsent => Expected is null && Exact is null;

    public double DigitsAgainst(Quantity truth) => Actual is { } actual ? truth.DigitsIn(actual, Scale) : double.NegativeInfinity;

    /// <summary>Digits against the best value known.</summary>
    public double CorrectDigits => (Exact ?? Expected) is { } truth ? DigitsAgainst(truth) : Actual is null ? 16 : double.NegativeInfinity;

    public bool Holds(double relativeTolerance) => MustBeAbsent
        ? Actual is null
        : Expected is not { } expected || DigitsAgainst(expected) >= -Math.Log10(relativeTolerance);

    public string Describe() => string.Create(
        CultureInfo.InvariantCulture,
        $"{Kind} [{Where}]: expected {Show(Expected)}, exact {Show(Exact)}, found {Show(Actual)}, {CorrectDigits:F1} digits");

    private static string Show(Quantity? value) => value?.ToString() ?? "none";
}
