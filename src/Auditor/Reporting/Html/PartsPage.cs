using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>One group in the parts of one division: a line for each part, each part's interval drawn on a common axis, and the test of the difference between them.</summary>
/// <param name="Strips">One for each part; null where there is nothing to draw.</param>
/// <param name="Bound">Place of the policy's bound on the axis.</param>
/// <param name="End">Where the axis ends, in words.</param>
internal sealed record PartsPage(ReportTable Table, IReadOnlyList<PartStrip?> Strips, string Bound, string End, FactList Difference, string? Why)
{
    private const string NoClassical = "A classical test does not apply.";
    private const double Left = 2;
    private const double Right = 98;

    public static IReadOnlyList<PartsPage> Of(Exclusion exclusion, double level) =>
        [.. exclusion.InParts.Select(division => Of(division, exclusion.Negligible.Bound, level))];

    private static PartsPage Of(GroupInParts division, double bound, double level)
    {
        var end = Math.Min(1, 1.06 * division.Parts.SelectMany(part => new[] { part.PartialRSquared.Estimate, part.PartialRSquared.BasisUpper }).OfType<double>().Append(2 * bound).Max());
        return new(
            TableOf(division, level),
            [.. division.Parts.Select(part => part.PartialRSquared.Estimate is double estimate ? Strip(part.Part, part.PartialRSquared, estimate, end) : null)],
            Across(bound, end),
            NumberText.Share(end),
            DifferenceOf(division.Difference, level),
            division.Why);
    }

    private static ReportTable TableOf(GroupInParts division, double level) => ReportTable.Of(
        division.Kind == Divisions.Segment ? $"By {division.By}" : char.ToUpperInvariant(division.By[0]) + division.By[1..],
        division.Parts,
        new("Part", "name", part => Cell.Name(part.Part)),
        new("Rows", "number", part => Cell.Count(part.Rows)),
        new("Test", "text", part => part.Basis is { } basis ? Cell.Words(TestWords.TitleOf(basis)) : Cell.Missing(part.Why)),
        new("p", "number", part => Cell.Probability(part.Test?.P, part.Test?.Log10P, level, part.Why)),
        new("p, adjusted", "number", part => Cell.Probability(part.PAdjusted, null, level, part.Why)),
        new("Partial F’s p", "number", part => Cell.Probability(part.Classical?.P, part.Classical?.Log10P, level, part.Why ?? NoClassical)),
        new("Partial R²", "number", part => Cell.Share(part.PartialRSquared.Estimate, part.PartialRSquared.Why)),
        new("Interval", "number", part => Cell.Range(part.PartialRSquared.BasisLower, part.PartialRSquared.BasisUpper, part.PartialRSquared.Why, NumberText.Share)));

    private static FactList DifferenceOf(DifferenceFigures difference, double level) => FactList.Of(
        new(
            "Difference between the parts, p",
            Cell.Probability(difference.Test?.P, difference.Test?.Log10P, level, difference.Why),
            difference.Basis is { } basis ? $"{TestWords.TitleOf(basis)}, {NumberText.Count(difference.PartsCompared)} parts compared; small: the effect is not the same in all" : null),
        new("the same, adjusted for all groups", Cell.Probability(difference.PAdjusted, null, level, difference.Why)),
        new("the same by the partial F", Cell.Probability(difference.Classical?.P, difference.Classical?.Log10P, level, difference.Why ?? NoClassical)));

    private static PartStrip Strip(string name, EffectFigures effect, double estimate, double end) => new(
        effect is { BasisLower: double lower, BasisUpper: double upper }
            ? $"{name}: partial R² {NumberText.Share(estimate)}, interval {NumberText.Share(lower)} to {NumberText.Share(upper)}"
            : $"{name}: partial R² {NumberText.Share(estimate)}, without an interval",
        Across(estimate, end),
        effect is { BasisLower: double from, BasisUpper: double to } ? new PictureSpan(Across(from, end), Across(to, end)) : null);

    /// <summary>A square-root axis, as in the picture of all exclusions.</summary>
    private static string Across(double value, double end) =>
        (Left + ((Right - Left) * Math.Sqrt(Math.Clamp(value / end, 0, 1)))).ToString("0.##", CultureInfo.InvariantCulture) + "%";
}

/// <summary>The interval of one part.</summary>
/// <param name="Finding">In words, for who cannot see it.</param>
internal sealed record PartStrip(string Finding, string Estimate, PictureSpan? Basis);
