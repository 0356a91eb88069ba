using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>One path element of a picture.</summary>
/// <param name="Kind">Its class in the style sheet.</param>
/// <param name="D">Its outline; thousands of dots are still one outline.</param>
internal sealed record PicturePath(string Kind, string D)
{
    private static readonly (string Kind, double Most)[] Sizes = [("dot one", 1), ("dot few", 10), ("dot many", 100), ("dot most", double.PositiveInfinity)];

    /// <summary>A tenth of a pixel, the same in every culture.</summary>
    public static string Place(double value) => value.ToString("0.#", CultureInfo.InvariantCulture) is "-0" ? "0" : value.ToString("0.#", CultureInfo.InvariantCulture);

    /// <summary>Dots as lines of no length with round ends: one path for each size, which tells how many observations a dot stands for.</summary>
    public static IReadOnlyList<PicturePath> Dots(IEnumerable<PlotPoint> points, PictureAxis x, PictureAxis y) =>
    [
        .. points.GroupBy(point => Array.FindIndex(Sizes, size => point.Count <= size.Most)).OrderByDescending(group => group.Key)
            .Select(group => Marks(Sizes[group.Key].Kind, group.Select(point => (point.X, point.Y)), x, y)),
    ];

    /// <summary>Dots of one size.</summary>
    public static PicturePath Marks(string kind, IEnumerable<(double X, double Y)> points, PictureAxis x, PictureAxis y) =>
        new(kind, string.Concat(points.Select(point => "M" + Pair(point.X, point.Y, x, y) + "h0").Distinct()));

    public static PicturePath Line(string kind, IEnumerable<(double X, double Y)> points, PictureAxis x, PictureAxis y) =>
        new(kind, "M" + string.Join("L", points.Select(point => Pair(point.X, point.Y, x, y)).Distinct()));

    /// <summary>Upright bars from zero.</summary>
    public static PicturePath Bars(string kind, IEnumerable<(double X, double Y)> points, PictureAxis x, PictureAxis y) =>
        new(kind, string.Concat(points.Select(point => "M" + Pair(point.X, 0, x, y) + "V" + Place(y.At(point.Y)))));

    /// <summary>The area between two lines, each given from left to right.</summary>
    public static PicturePath Band(string kind, IReadOnlyList<(double X, double Y)> lower, IReadOnlyList<(double X, double Y)> upper, PictureAxis x, PictureAxis y) =>
        Line(kind, Thinned(lower, x).Concat(Thinned(upper, x).Reverse()), x, y) is var line ? line with { D = line.D + "Z" } : line;

    /// <summary>At most one point a pixel.</summary>
    private static IEnumerable<(double X, double Y)> Thinned(IReadOnlyList<(double X, double Y)> points, PictureAxis x) =>
        points.GroupBy(point => Math.Round(x.At(point.X))).Select(group => group.First()).Append(points[^1]);

    private static string Pair(double px, double py, PictureAxis x, PictureAxis y) => Place(x.At(px)) + " " + Place(y.At(py));
}
