using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>One group in the parts of one division: a line for each part, each part's interval drawn on one axis for all divisions, and the test of the difference between them.</summary>
/// <param name="Strips">One for each part; null where there is nothing to draw.</param>
/// <param name="Bound">Place of the policy's bound on the axis.</param>
/// <param name="End">Where the axis ends, in words.</param>
/// <param name="Outside">Rows of the group in no part, in words; null when the parts add up.</param>
internal sealed record PartsPage(ReportTable Table, IReadOnlyList<PartStrip?> Strips, string Bound, string End, FactList Difference, string? Outside, string? Why)
{
    private const string NoClassical = "A classical test does not apply.";
    private const double Left = 2;
    private const double Right = 98;

    public static IReadOnlyList<PartsPage> Of(Exclusion exclusion, double level)
    {
        double bound = exclusion.Negligible.Bound;
        GroupInParts[] divisions = [.. exclusion.InParts.Select(division => division with { Parts = [.. division.Parts.Select(part => Shown(part, level))] })];
        var ends = divisions.SelectMany(division => division.Parts).SelectMany(part => new[] { part.PartialRSquared.Estimate, part.PartialRSquared.BasisUpper });
        double end = Math.Min(1, 1.06 * ends.OfType<double>().Append(2 * bound).Max());
        return [.. divisions.Select(division => Of(division, exclusion.Rows, bound, end, level))];
    }

    private static PartsPage Of(GroupInParts division, int rows, double bound, double end, double level) => new(
        TableOf(division, level),
        [.. division.Parts.Select(part => part.PartialRSquared.Estimate is double estimate ? Strip(part.Part, part.PartialRSquared, estimate, end) : null)],
        Across(bound, end),
        NumberText.Share(end),
        DifferenceOf(division.Difference, level),
        OutsideOf(division, rows),
        division.Why);

    /// <summary>A test that cannot reject says nothing of the effect's size.</summary>
    private static PartFigures Shown(PartFigures part, double level) => CannotReject(part.Test, level)
        ? part with { PartialRSquared = part.PartialRSquared with { BasisLower = null, BasisUpper = null, Why = ShownExclusion.CannotReject } }
        : part;

    private static bool CannotReject(TestFigures? test, double level) => test?.CeilingP > level;

    private static ReportTable TableOf(GroupInParts division, double level)
    {
        string[] tests = [.. division.Parts.Select(part => part.Basis).OfType<string>().Distinct()];
        string by = division.Kind == Divisions.Segment ? $"By {division.By}" : char.ToUpperInvariant(division.By[0]) + division.By[1..];
        return ReportTable.Of(
            tests.Length == 1 ? $"{by}: {TestWords.TitleOf(tests[0])}" : by,
            division.Parts,
            new("Part", "name", part => Cell.Name(part.Part)),
            new("Rows", "number", part => Cell.Count(part.Rows)),
            new("Test", "text", part => Title(tests.Length == 1 ? null : part.Basis, part.Test) is { Length: > 0 } title ? Cell.Words(title) : Cell.Missing(part.Why ?? part.Test?.Why)),
            new("p", "number", part => Cell.Probability(part.Test?.P, part.Test?.Log10P, level, part.Why)),
            new("p, adjusted", "number", part => Cell.Probability(part.PAdjusted, null, level, part.Why)),
            new("Partial F’s p", "number", part => Cell.Probability(part.Classical?.P, part.Classical?.Log10P, level, part.Why ?? NoClassical)),
            new("Partial R²", "number", part => Cell.Share(part.PartialRSquared.Estimate, part.PartialRSquared.Why)),
            new("Interval", "number", part => Cell.Range(part.PartialRSquared.BasisLower, part.PartialRSquared.BasisUpper, part.PartialRSquared.Why, NumberText.Share)));
    }

    /// <summary>"Robust F (HC3), F = 100.7 on 2 and 304"; without the name where the caption has it.</summary>
    private static string Title(string? basis, TestFigures? test) => string.Join(
        ", ",
        new[]
        {
            basis is null ? null : TestWords.TitleOf(basis),
            test is { F: double f, Df1: double df1, Df2: double df2 } ? $"F\u00A0=\u00A0{NumberText.Number(f)} on\u00A0{NumberText.Count(df1)} and\u00A0{NumberText.Count(df2)}" : null,
        }.OfType<string>());

    private static string? OutsideOf(GroupInParts division, int rows)
    {
        int outside = rows - division.Parts.Sum(part => part.Rows);
        string of = division.Kind == Divisions.Segment ? $" without a value of {division.By}" : "";
        return division.Parts.Count == 0 || outside <= 0 ? null
            : outside == 1 ? $"1 row{of} is in no part."
            : $"{NumberText.Count(outside)} rows{of} are in no part.";
    }

    private static FactList DifferenceOf(DifferenceFigures difference, double level) => FactList.Of([
        .. Outcome(difference, level),
        new(
            "p of the difference",
            Cell.Probability(difference.Test?.P, difference.Test?.Log10P, level, difference.Why),
            difference.Basis is { } basis ? $"{Title(basis, difference.Test)}; {NumberText.Count(difference.PartsCompared)} parts compared" : null),
        new("the same, adjusted for all groups", Cell.Probability(difference.PAdjusted, null, level, difference.Why)),
        new("the same by the partial F", Cell.Probability(difference.Classical?.P, difference.Classical?.Log10P, level, difference.Why ?? NoClassical)),
    ]);

    /// <summary>What the difference's p says at the policy's level; nothing when there is none.</summary>
    private static IEnumerable<Fact> Outcome(DifferenceFigures difference, double level)
    {
        if ((difference.PAdjusted ?? difference.Test?.P) is double p)
        {
            bool differs = p <= level;
            yield return new Fact(
                "Between the parts",
                Cell.Words(differs ? "The effect is not the same in all parts" : "No difference shown"),
                !differs && CannotReject(difference.Test, level) ? ShownExclusion.CannotReject
                    : $"at {NumberText.Percent(level)}, by {(difference.PAdjusted is null ? "p" : "the adjusted p")}{(differs ? "" : "; this is no evidence that there is none")}");
        }
    }

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
