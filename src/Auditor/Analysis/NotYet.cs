using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Parts of the record that are not computed yet: listed with the reason, never left out, the author's digits kept.</summary>
internal static class NotYet
{
    private const string NotCompared = "not_compared";

    public static IReadOnlyList<ClaimResult> Claims(ModelDeclaration declaration)
    {
        var claims = new List<ClaimResult>();
        void Add(string path, ReportedFigure? figure)
        {
            if (figure is not null)
            {
                claims.Add(new ClaimResult(path, figure.Text, null, NotCompared));
            }
        }

        AddFit(declaration.Reported, Add);
        foreach (var group in declaration.LeftOut)
        {
            AddTest($"left_out[{group.Name}].reported", group.Reported, Add);
        }

        foreach (var (step, index) in (declaration.Elimination?.Steps ?? []).Select((step, index) => (step, index + 1)))
        {
            AddTest(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"elimination.steps[{index}].reported"), step.Reported, Add);
        }

        return claims;
    }

    private static void AddFit(ReportedFigures? reported, Action<string, ReportedFigure?> add)
    {
        add("reported.rows_used", reported?.RowsUsed);
        add("reported.r_squared", reported?.RSquared);
        add("reported.adjusted_r_squared", reported?.AdjustedRSquared);
        add("reported.residual_sd", reported?.ResidualSd);
        add("reported.f", reported?.F);
        foreach (var coefficient in reported?.Coefficients ?? [])
        {
            var path = $"reported.coefficients[{coefficient.Label}].";
            add(path + "estimate", coefficient.Estimate);
            add(path + "standard_error", coefficient.StandardError);
            add(path + "p", coefficient.P);
        }
    }

    private static void AddTest(string path, ReportedTest? reported, Action<string, ReportedFigure?> add)
    {
        add(path + ".f", reported?.F);
        for (var i = 0; i < (reported?.Df.Count ?? 0); i++)
        {
            add(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{path}.df[{i + 1}]"), reported!.Df[i]);
        }

        add(path + ".p", reported?.P);
    }
}
