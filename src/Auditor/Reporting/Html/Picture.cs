namespace Auditor.Reporting.Html;

/// <summary>One picture with two axes, laid out; the page scales it to the room there is.</summary>
/// <param name="Title">What it shows here.</param>
/// <param name="Finding">The numbers behind the title.</param>
/// <param name="Reading">How to read the picture.</param>
/// <param name="Paths">From back to front.</param>
internal sealed record Picture(
    string Anchor, string Name, string Title, string Finding, string Reading, string Across, string Up,
    PictureAxis X, PictureAxis Y, IReadOnlyList<PicturePath> Paths, IReadOnlyList<PictureLabel> Labels)
{
    public const int Width = 420;
    public const int Height = 300;
    public const int Left = 54;
    public const int Right = 410;
    public const int Top = 24;
    public const int Bottom = 252;

    public IReadOnlyList<PictureTick> XTicks => X.Ticks(5);

    public IReadOnlyList<PictureTick> YTicks => Y.Ticks(8);

    public static PictureAxis Horizontal(IEnumerable<double> values) => PictureAxis.Covering(values, Left, Right);

    public static PictureAxis Vertical(IEnumerable<double> values) => PictureAxis.Covering(values, Bottom, Top);
}

/// <param name="Anchor">start, middle or end: which part of the text stands at the place.</param>
internal sealed record PictureLabel(string X, string Y, string Anchor, string Text, string Kind);
