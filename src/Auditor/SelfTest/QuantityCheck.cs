using Auditor.Results;

namespace Auditor.SelfTest;

/// <summary>Holds figures against the floors of their kinds.</summary>
internal static class QuantityCheck
{
    /// <param name="floors">Digits that must agree, by kind. A kind that nothing was compared for has failed.</param>
    public static IReadOnlyList<SelfTestQuantity> Of(IReadOnlyList<Figure> figures, IReadOnlyDictionary<string, int> floors)
    {
        var compared = figures.Select(figure => Of(figure, floors));
        var missing = floors.Keys.Except(figures.Select(figure => figure.Kind)).Order(StringComparer.Ordinal);
        return [.. compared, .. missing.Select(kind => new SelfTestQuantity(kind, "nothing was compared", null, null, false, null, floors[kind], false))];
    }

    private static SelfTestQuantity Of(Figure figure, IReadOnlyDictionary<string, int> floors)
    {
        if (figure.MustBeAbsent)
        {
            return new SelfTestQuantity(figure.Kind, figure.Where, null, Finite(figure.Actual?.Number), false, null, null, figure.Actual is null);
        }

        var truth = (figure.Exact ?? figure.Expected)!.Value;
        int? floor = floors.TryGetValue(figure.Kind, out var least) ? least : null;
        double? digits = double.IsFinite(figure.CorrectDigits) ? figure.CorrectDigits : null;
        var log10 = figure.Actual is { } actual && truth.IsComparedByLogarithm(actual);
        return new SelfTestQuantity(
            figure.Kind,
            figure.Where,
            log10 ? truth.Log10 : truth.Number,
            log10 ? figure.Actual!.Value.Log10 : Finite(figure.Actual?.Number),
            log10,
            digits,
            floor,
            digits >= floor);
    }

    private static double? Finite(double? value) => value is double number && double.IsFinite(number) ? number : null;
}
