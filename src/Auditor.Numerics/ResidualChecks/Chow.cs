using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// Chow's check. Null: the coefficients are the same in both parts of the rows. Partial F of the final model's columns times an indicator of the second part, on
/// (r1 + r2 - r, n - r1 - r2), r1 and r2 the ranks of the columns in the parts; exact under normal errors of equal variance. A part that its own coefficients would fit
/// perfectly leaves the predictive form: the F of the part's rows against the other part's fit.
/// </summary>
/// <remarks>Chow 1960, Econometrica 28. Verified against R (tests/reference); predictive form against R's anova with a dummy for each row of the part (ResidualChecks/values of the tests).</remarks>
public static class Chow
{
    /// <param name="second">Whether each row, by position, lies in the second part.</param>
    public static CheckOutcome Of(CheckedFit fit, IReadOnlyList<bool> second)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var group = Group(fit, second);
        var outcome = group.Rank == 0 ? CheckOutcome.None(CheckImpediment.EmptyPart) : PartialFCheck.Of(group);
        return outcome is CheckStatistic check ? check with { Predictive = IsPredictive(fit, second, group.Rank) } : outcome;
    }

    private static AddedGroup Group(CheckedFit fit, IReadOnlyList<bool> second)
    {
        var columns = fit.Final.Factor.Layout.FinalColumns;
        var layout = new DesignLayout(fit.Final.Factor.Layout.Intercept, columns, [new ColumnRange(columns, columns)]);
        var rows = new DerivedRows(fit.Design, layout, keepWeights: true, (source, derived) => Fill(columns, second, source, derived));
        return AddedGroup.Of(FinalFactor.Of(FactorBuilder.Build(rows, fit.Threads)), [.. layout.Groups[0].Indices]);
    }

    /// <summary>As many directions are added as a part has observations.</summary>
    private static bool IsPredictive(CheckedFit fit, IReadOnlyList<bool> second, int rank)
    {
        var inSecond = second.Count(one => one);
        return Math.Min(inSecond, second.Count - inSecond) <= rank;
    }

    private static void Fill(int columns, IReadOnlyList<bool> second, RowBlock source, RowBlock derived)
    {
        for (var c = 0; c < columns; c++)
        {
            source.Column(c).CopyTo(derived.Column(c));
            for (var i = 0; i < derived.Rows; i++)
            {
                derived.Column(columns + c)[i] = second[derived.FirstRow + i] ? source.Column(c)[i] : 0;
            }
        }

        source.Column(source.Columns - 1).CopyTo(derived.Column(derived.Columns - 1));
    }
}
