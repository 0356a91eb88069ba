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
            consistent ? null : $"{Figures(others)} give {expected}, and {follows.Figure.Text} is printed");
    }

    private static string Figures(IReadOnlyList<ClaimedFigure> figures) => string.Join(", ", figures.Select(figure => $"{Name(figure)} {figure.Figure.Text}"));

    /// <summary>The figure's name where it is clear what it is of.</summary>
    private static string Name(ClaimedFigure figure) => figure.Kind switch
    {
        ClaimKinds.F => "F",
        ClaimKinds.RSquared => figure.Path == DeclaredClaims.AdjustedPath ? "adjusted R²" : "R²",
        _ => figure.Kind.Replace('_', ' '),
    };
}
