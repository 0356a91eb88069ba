using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>
/// Where everything lies in the picture of partial R². Across, positions are shares of the width, so that the picture fits any width with its letters at their own
/// size; down, they are pixels. The axis is a square-root one: 0.01 and 0.3 are then both readable, and zero has a place.
/// </summary>
internal sealed record IntervalPicture(int Height, IReadOnlyList<PictureRow> Rows, IReadOnlyList<PictureTick> Ticks, string Bound, Cell BoundText, bool Classical)
{
    public const int RowHeight = 46;
    private const int Top = 40;
    private const int Bottom = 30;
    private const int LongestName = 38;
    private const double Left = 2;
    private const double Right = 98;
    private static readonly double[] Candidates = [0, 0.001, 0.01, 0.03, 0.1, 0.2, 0.3, 0.5, 0.7, 1];

    /// <summary>Bottom of the ruled part.</summary>
    public int Floor => Height - Bottom;

    public int TickText => Height - 10;

    /// <summary>Null when no group has an effect to draw.</summary>
    public static IntervalPicture? Of(IReadOnlyList<Exclusion> exclusions)
    {
        Exclusion[] drawn = [.. exclusions.Where(exclusion => exclusion.PartialRSquared.Estimate is not null)];
        if (drawn.Length == 0)
        {
            return null;
        }

        double bound = drawn[0].Negligible.Bound;
        double end = Math.Min(1, 1.06 * drawn.SelectMany(Ends).Append(bound * 2).Max());
        return new(
            Top + (drawn.Length * RowHeight) + Bottom,
            [.. drawn.Select((exclusion, index) => Row(exclusion, index, end))],
            [.. Candidates.Where(value => value <= end && value != bound).Select(value => new PictureTick(Across(value, end), NumberText.Plain(value)))],
            Across(bound, end),
            Cell.Number(bound) with { Text = NumberText.Plain(bound) },
            drawn.Any(exclusion => exclusion.PartialRSquared.Lower is not null));
    }

    private static PictureRow Row(Exclusion exclusion, int index, double end)
    {
        EffectFigures effect = exclusion.PartialRSquared;
        int baseline = Top + (index * RowHeight);
        return new(
            ShortName.Of(exclusion.Group, LongestName), exclusion.Group, VerdictWords.Of(exclusion), baseline + 14, baseline + 30,
            Across(effect.Estimate!.Value, end), Span(effect.Lower, effect.Upper, end), Span(effect.BasisLower, effect.BasisUpper, end),
            Against(effect, exclusion.Negligible.Bound));
    }

    /// <summary>The finding of one row in words, for who cannot see the picture.</summary>
    private static string Against(EffectFigures effect, double bound)
    {
        string estimate = NumberText.Share(effect.Estimate!.Value);
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

/// <param name="NameAt">Baseline of the name, in pixels from the top.</param>
/// <param name="LineAt">Height of the interval, in pixels from the top.</param>
internal sealed record PictureRow(
    string Name, string WholeName, VerdictWords Verdict, int NameAt, int LineAt, string Estimate, PictureSpan? Classical, PictureSpan? Basis, string Finding);

internal sealed record PictureSpan(string From, string To);

internal sealed record PictureTick(string At, string Text);
