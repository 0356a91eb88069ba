using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>Names beside the points they belong to, on the side that has room, one never over another.</summary>
internal static class PictureLabels
{
    private const int Longest = 14;
    private const double LineHeight = 13;
    private const double Gap = 7;

    public static IReadOnlyList<PictureLabel> Of(IReadOnlyList<NamedPoint> named, PictureAxis x, PictureAxis y)
    {
        var heights = new List<double>();
        var labels = new List<PictureLabel>();
        foreach (var point in named)
        {
            bool leftOf = x.At(point.X) > (Picture.Left + Picture.Right) / 2.0;
            double height = Free(y.At(point.Y) + 4, heights);
            heights.Add(height);
            labels.Add(new(PicturePath.Place(x.At(point.X) + (leftOf ? -Gap : Gap)), PicturePath.Place(height), leftOf ? "end" : "start", Text(point), "row"));
        }

        return labels;
    }

    /// <summary>The row's label, or its number in the source.</summary>
    public static string Text(NamedPoint point) => ShortName.Of(point.Label ?? "row " + NumberText.Count(point.Row), Longest);

    /// <summary>The nearest height to the wished one that is a line away from all taken ones, within the ruled part.</summary>
    private static double Free(double wish, List<double> taken) => Enumerable.Range(0, 2 * (taken.Count + 1))
        .SelectMany(step => new[] { wish + (step * LineHeight), wish - (step * LineHeight) })
        .Where(height => height is >= Picture.Top + 8 and <= Picture.Bottom)
        .FirstOrDefault(height => taken.All(other => Math.Abs(other - height) >= LineHeight - 0.01), wish);
}
