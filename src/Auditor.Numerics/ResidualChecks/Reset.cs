using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// RESET. Null: the second and third power of the fitted value add nothing to the final model. Partial F of these two columns on (2, n - r - 2). Centred and scaled before
/// they are raised (which changes no test of a model with an intercept, and is only scaled without one), so that large responses lose no digits.
/// </summary>
/// <remarks>Ramsey 1969, JRSS B 31. Verified against R's lmtest (tests/reference); AGREEMENT.md there says where another program goes wrong.</remarks>
public static class Reset
{
    public static CheckOutcome Of(CheckedFit fit)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        var (centre, scale) = Range(fit);
        if (scale == 0)
        {
            return CheckOutcome.None(CheckImpediment.NothingToRelate);
        }

        var columns = fit.Final.Factor.Layout.FinalColumns;
        var layout = new DesignLayout(fit.Final.Factor.Layout.Intercept, columns, [new ColumnRange(columns, 2)]);
        var rows = new DerivedRows(fit.Design, layout, keepWeights: true, (source, derived) => Fill(fit, centre, scale, source, derived));
        var group = AddedGroup.Of(FinalFactor.Of(FactorBuilder.Build(rows)), [columns, columns + 1]);
        return PartialF.Of(group) is FTest f
            ? new CheckStatistic(f.Statistic, f.Df1, f.Df2, f.Probability) { LogP = f.LogP }
            : CheckOutcome.None(group.Rank == 0 ? CheckImpediment.NothingToRelate : PartialF.ResidualDf(group) <= 0 ? CheckImpediment.TooFew : CheckImpediment.NoResiduals);
    }

    private static void Fill(CheckedFit fit, double centre, double scale, RowBlock source, RowBlock derived)
    {
        var columns = fit.Final.Factor.Layout.FinalColumns;
        for (var c = 0; c < columns; c++)
        {
            source.Column(c).CopyTo(derived.Column(c));
        }

        var square = derived.Column(columns);
        var cube = derived.Column(columns + 1);
        FittedValues.Fill(fit, source, cube);
        for (var i = 0; i < cube.Length; i++)
        {
            var value = (cube[i] - centre) / scale;
            (square[i], cube[i]) = (value * value, value * value * value);
        }

        source.Column(source.Columns - 1).CopyTo(derived.Column(derived.Columns - 1));
    }

    private static (double Centre, double Scale) Range(CheckedFit fit)
    {
        var (least, greatest) = (double.PositiveInfinity, double.NegativeInfinity);
        var values = Array.Empty<double>();
        foreach (var block in fit.Design.Blocks())
        {
            values = values.Length < block.Stride ? new double[block.Stride] : values;
            FittedValues.Fill(fit, block, values.AsSpan(0, block.Rows));
            foreach (var value in values.AsSpan(0, block.Rows))
            {
                (least, greatest) = (Math.Min(least, value), Math.Max(greatest, value));
            }
        }

        return fit.Final.Factor.Layout.Intercept
            ? ((least + greatest) / 2, (greatest - least) / 2)
            : (0, Math.Max(Math.Abs(least), Math.Abs(greatest)));
    }
}
