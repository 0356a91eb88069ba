using Auditor.Declaration;

namespace Auditor.Analysis.Claims;

/// <summary>One figure of the author's report: where the declaration says it, what it is, and its digits.</summary>
/// <param name="Path">Path in the declaration, as the record writes it.</param>
/// <param name="What">In words.</param>
/// <param name="Kind">One of <see cref="Results.ClaimKinds"/>.</param>
internal sealed record ClaimedFigure(string Path, string What, string Kind, ReportedFigure Figure)
{
    public PrintedNumber Printed { get; } = Figure.Number;

    public static ClaimedFigure? Of(string path, string what, string kind, ReportedFigure? figure) =>
        figure is null ? null : new ClaimedFigure(path, what, kind, figure);
}

/// <summary>The figures of the final model as a whole.</summary>
internal sealed record ClaimedFit(
    ClaimedFigure? Rows, ClaimedFigure? RSquared, ClaimedFigure? AdjustedRSquared, ClaimedFigure? ResidualSd, ClaimedFigure? F, IReadOnlyList<ClaimedCoefficient> Coefficients);

internal sealed record ClaimedCoefficient(string Label, ClaimedFigure? Estimate, ClaimedFigure? StandardError, ClaimedFigure? P);

/// <summary>The figures of one test, of a left-out group or of a step of the elimination.</summary>
/// <param name="Of">Position of the group, or of the step, 0-based.</param>
internal sealed record ClaimedTest(int Of, string Path, ClaimedFigure? F, ClaimedFigure? Df1, ClaimedFigure? Df2, ClaimedFigure? P)
{
    public IReadOnlyList<ClaimedFigure> All => [.. new[] { F, Df1, Df2, P }.OfType<ClaimedFigure>()];
}
