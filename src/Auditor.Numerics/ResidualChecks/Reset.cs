using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// RESET. Null: the second and third power of the fitted value add nothing to the final model. Partial F of these two columns on (2, n - r - 2), exact under normal errors
/// of equal variance. Centred and scaled before
/// they are raised (which changes no test of a model with an intercept, and is only scaled without one), so that large responses lose no digits.
/// </summary>
/// <remarks>Ramsey 1969, JRSS B 31. Verified against R's lmtest (tests/reference); AGREEMENT.md there says where another program goes wrong.</remarks>
public static class Reset
{
    private const int Powers = 2;

    public static CheckOutcome Of(CheckedFit fit)
    {
        if (fit.Impediment is { } impediment)
        {
            return CheckOutcome.None(impediment);
        }

        if (fit.FittedIsConstant)
        {
            return CheckOutcome.None(CheckImpediment.NothingToRelate);
        }

        var group = Group(fit);
        return group.Rank < Powers ? CheckOutcome.None(CheckImpediment.PowersAddNothing) : PartialFCheck.Of(group);
    }

    private static AddedGroup Group(CheckedFit fit)
    {
        var columns = fit.Final.Factor.Layout.FinalColumns;
        var layout = new DesignLayout(fit.Final.Factor.Layout.Intercept, columns, [new ColumnRange(columns, Powers)]);
        var rows = new DerivedRows(fit.Design, layout, keepWeights: true, (source, derived) => Fill(fit, source, derived));
        return AddedGroup.Of(FinalFactor.Of(FactorBuilder.Build(rows, fit.Threads)), [columns, columns + 1]);
    }

    private static void Fill(CheckedFit fit, RowBlock source, RowBlock derived)
    {
        var columns = fit.Final.Factor.Layout.FinalColumns;
        for (var c = 0; c < columns; c++)
        {
            source.Column(c).CopyTo(derived.Column(c));
        }

        var square = derived.Column(columns);
        var cube = derived.Column(columns + 1);
        FittedValues.FillScaled(fit, source, cube);
        for (var i = 0; i < cube.Length; i++)
        {
            var value = cube[i];
            (square[i], cube[i]) = (value * value, value * value * value);
        }

        source.Column(source.Columns - 1).CopyTo(derived.Column(derived.Columns - 1));
    }
}
