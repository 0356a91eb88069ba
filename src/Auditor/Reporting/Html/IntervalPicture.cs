using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>
/// Where everything lies in the picture of partial R², a strip beside each exclusion's line and one axis below. Positions are shares of the width, so that the
/// picture fits any width with its letters at their own size. The axis is a square-root one: 0.01 and 0.3 are then both readable, and zero has a place.
/// </summary>
/// <param name="Rows">One for each exclusion; null where there is no effect to draw.</param>
/// <param name="Classical">Some row shows a classical interval.</param>
internal sealed record IntervalPicture(IReadOnlyList<PictureRow?> Rows, IReadOnlyList<PictureTick> Ticks, string Bound, Cell BoundText, bool Classical)
{
    private const double Left = 2;
    private const double Right = 98;
    private const double LeastApart = 0.13;
    private static readonly double[] Candidates = [0, 0.1, 0.3, 1, 0.03, 0.001, 0.01, 0.5, 0.2, 0.7];

    /// <summary>Null when no group has an effect to draw.</summary>
    public static IntervalPicture? Of(IReadOnlyList<Exclusion> recorded)
    {
        Exclusion[] exclusions = [.. recorded.Select(ShownExclusion.Of)];
        Exclusion[] drawn = [.. exclusions.Where(exclusion => exclusion.PartialRSquared.Estimate is not null)];
        if (drawn.Length == 0)
        {
            return null;
        }

        double bound = drawn[0].Negligible.Bound;
        double end = Math.Min(1, 1.06 * drawn.SelectMany(Ends).Append(bound * 2).Max());
        return new(
            [.. exclusions.Select(exclusion => exclusion.PartialRSquared.Estimate is double estimate ? Row(exclusion, estimate, end) : null)],
            TicksOf(bound, end),
            Across(bound, end),
            Cell.Number(bound) with { Text = NumberText.Plain(bound) },
            drawn.Any(exclusion => exclusion.PartialRSquared.Lower is not null));
    }

    /// <summary>Round values with room between them and the bound.</summary>
    private static IReadOnlyList<PictureTick> TicksOf(double bound, double end)
    {
        var taken = new List<double> { bound };
        foreach (double value in Candidates.Where(value => value <= end))
        {
            if (taken.All(other => Math.Abs(Math.Sqrt(value / end) - Math.Sqrt(other / end)) >= LeastApart))
            {
                taken.Add(value);
            }
        }

        return [.. taken.Where(value => value != bound).Order().Select(value => new PictureTick(Across(value, end), NumberText.Plain(value)))];
    }

    private static PictureRow Row(Exclusion exclusion, double estimate, double end)
    {
        EffectFigures effect = exclusion.PartialRSquared;
        return new(
            exclusion.Group, VerdictWords.Of(exclusion), Across(estimate, end), Span(effect.Lower, effect.Upper, end), Span(effect.BasisLower, effect.BasisUpper, end),
            Against(effect, estimate, exclusion.Negligible.Bound));
    }

    /// <summary>The finding of one row in words, for who cannot see the picture.</summary>
    private static string Against(EffectFigures effect, double value, double bound)
    {
        string estimate = "partial R² " + NumberText.Share(value);
        if (effect.Why is { } why)
        {
            return $"{estimate}, without an interval of the test the verdict rests on: {why}";
        }

        if ((effect.BasisLower ?? effect.Lower) is not double lower || (effect.BasisUpper ?? effect.Upper) is not double upper)
        {
            return $"{estimate}, without an interval";
        }

        string place = upper < bound ? "wholly below the bound" : lower > bound ? "wholly above the bound" : "on both sides of the bound";
        return $"{estimate}, interval {NumberText.Share(lower)} to {NumberText.Share(upper)}, {place}";
    }

    private static IEnumerable<double> Ends(Exclusion exclusion)
    {
        EffectFigures effect = exclusion.PartialRSquared;
        return new[] { effect.Estimate, effect.Upper, effect.BasisUpper }.OfType<double>();
    }

    private static PictureSpan? Span(double? lower, double? upper, double end) =>
        lower is double from && upper is double to ? new(Across(from, end), Across(to, end)) : null;

    private static string Across(double value, double end) =>
        (Left + ((Right - Left) * Math.Sqrt(Math.Clamp(value / end, 0, 1)))).ToString("0.##", CultureInfo.InvariantCulture) + "%";
}

internal sealed record PictureRow(string Name, VerdictWords Verdict, string Estimate, PictureSpan? Classical, PictureSpan? Basis, string Finding);

internal sealed record PictureSpan(string From, string To);

internal sealed record PictureTick(string At, string Text);
