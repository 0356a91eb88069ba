using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>What pictures of points have in common.</summary>
internal static class PictureParts
{
    public const string Units = ", in units of the response";

    public static string Residual(bool weighted) => (weighted ? "Residual times the root of its weight" : "Residual of the final model") + Units;

    public static string Dots(PointCloud cloud) =>
        (cloud.OneIn > 1 ? $"One row in {NumberText.Count(cloud.OneIn)} is drawn, and the rows that bear most on the fit. " : "")
        + (cloud.Binned ? $"{NumberText.Count(cloud.Rows)} rows: a larger dot stands for up to 10, up to 100 or more of them. " : "");

    public static PicturePath Level(double value, PictureAxis x, PictureAxis y) => PicturePath.Line("level", [(x.Low, value), (x.High, value)], x, y);

    public static IReadOnlyList<PicturePath> Cloud(PointCloud cloud, PictureAxis x, PictureAxis y)
    {
        var dots = PicturePath.Dots(cloud.Points, x, y);
        return cloud.Trend.Count > 1 ? [.. dots, PicturePath.Line("trend", cloud.Trend.Select(point => (point.X, point.Y)), x, y)] : dots;
    }

    /// <summary>The part of a line through the origin that lies within both axes.</summary>
    public static PicturePath Through(double slope, PictureAxis x, PictureAxis y)
    {
        double left = x.Low, right = x.High;
        if (slope != 0)
        {
            var (one, other) = (y.Low / slope, y.High / slope);
            left = Math.Max(left, Math.Min(one, other));
            right = Math.Min(right, Math.Max(one, other));
        }

        return PicturePath.Line("trend", [(left, slope * left), (right, slope * right)], x, y);
    }
}
