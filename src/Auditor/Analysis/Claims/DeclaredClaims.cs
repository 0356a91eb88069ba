using System.Globalization;
using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis.Claims;

/// <summary>Every figure that a declaration repeats from the report, each with its path and words.</summary>
internal sealed record DeclaredClaims(ClaimedFit Fit, IReadOnlyList<ClaimedTest> Groups, IReadOnlyList<ClaimedTest> Steps)
{
    public const string AdjustedPath = "reported.adjusted_r_squared";

    public IEnumerable<ClaimedFigure> All =>
    [
        .. new[] { Fit.Rows, Fit.RSquared, Fit.AdjustedRSquared, Fit.ResidualSd, Fit.F }.OfType<ClaimedFigure>(),
        .. Fit.Coefficients.SelectMany(one => new[] { one.Estimate, one.StandardError, one.P }).OfType<ClaimedFigure>(),
        .. Groups.Concat(Steps).SelectMany(test => test.All),
    ];

    public static DeclaredClaims Of(ModelDeclaration declaration) => new(
        FitOf(declaration.Reported),
        [.. declaration.LeftOut.Select((group, g) => Test(g, $"left_out[{group.Name}].reported", $"the left-out group {group.Name}", group.Reported))],
        [.. (declaration.Elimination?.Steps ?? []).Select((step, k) => Test(
            k, string.Create(CultureInfo.InvariantCulture, $"elimination.steps[{k + 1}].reported"), string.Create(CultureInfo.InvariantCulture, $"step {k + 1}, dropping {step.Drop}"), step.Reported))]);

    /// <summary>Whether the declaration repeats a figure that some covariance of the coefficients could reproduce.</summary>
    public static bool NeedCovariances(ModelDeclaration declaration) =>
        declaration.Reported is { } reported && (reported.F is not null || reported.Coefficients.Any(one => one.StandardError is not null || one.P is not null));

    private static ClaimedFit FitOf(ReportedFigures? reported) => new(
        ClaimedFigure.Of("reported.rows_used", "Rows used", ClaimKinds.Rows, reported?.RowsUsed),
        ClaimedFigure.Of("reported.r_squared", "R²", ClaimKinds.RSquared, reported?.RSquared),
        ClaimedFigure.Of(AdjustedPath, "Adjusted R²", ClaimKinds.RSquared, reported?.AdjustedRSquared),
        ClaimedFigure.Of("reported.residual_sd", "Residual standard deviation", ClaimKinds.ResidualSd, reported?.ResidualSd),
        ClaimedFigure.Of("reported.f", "F of the whole model", ClaimKinds.F, reported?.F),
        [.. (reported?.Coefficients ?? []).Select(Coefficient)]);

    private static ClaimedCoefficient Coefficient(ReportedCoefficient reported)
    {
        var path = $"reported.coefficients[{reported.Label}].";
        return new ClaimedCoefficient(
            reported.Label,
            ClaimedFigure.Of(path + "estimate", "Coefficient of " + reported.Label, ClaimKinds.Estimate, reported.Estimate),
            ClaimedFigure.Of(path + "standard_error", "Standard error of " + reported.Label, ClaimKinds.StandardError, reported.StandardError),
            ClaimedFigure.Of(path + "p", "p of " + reported.Label, ClaimKinds.P, reported.P));
    }

    private static ClaimedTest Test(int of, string path, string what, ReportedTest? reported) => new(
        of,
        path,
        ClaimedFigure.Of(path + ".f", "F of " + what, ClaimKinds.F, reported?.F),
        ClaimedFigure.Of(path + ".df[1]", "First degrees of freedom of " + what, ClaimKinds.Df, reported?.Df.ElementAtOrDefault(0)),
        ClaimedFigure.Of(path + ".df[2]", "Second degrees of freedom of " + what, ClaimKinds.Df, reported?.Df.ElementAtOrDefault(1)),
        ClaimedFigure.Of(path + ".p", "p of " + what, ClaimKinds.P, reported?.P));
}
