using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>A relation between reported figures, put to the test: a contradiction only when no numbers that round to them can meet it.</summary>
internal static class Relation
{
    /// <param name="follows">The figure that follows from the others.</param>
    /// <param name="claimed">What it can stand for.</param>
    /// <param name="expected">What the others make of it.</param>
    public static ClaimRelation Of(ClaimedFigure follows, Interval claimed, IReadOnlyList<ClaimedFigure?> from, Interval expected, string relation)
    {
        var consistent = expected.Meets(claimed);
        var others = from.OfType<ClaimedFigure>().ToList();
        return new ClaimRelation(
            [follows.Path, .. others.Select(figure => figure.Path)],
            relation,
            consistent,
            consistent ? null : $"{Figures(others)} give {expected}; {follows.Figure.Text} was printed");
    }

    private static string Figures(IReadOnlyList<ClaimedFigure> figures) =>
        string.Join(", ", figures.Select(figure => $"{Lowered(figure.What)} {figure.Figure.Text}"));

    private static string Lowered(string what) => what is ['R', '²', ..] or ['F', ' ', ..] ? what : char.ToLowerInvariant(what[0]) + what[1..];
}
