using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Fitted values of the final model.</summary>
public static class FittedValues
{
    /// <summary>X b of every row, in order, on the response's scale.</summary>
    public static double[] Of(CheckedFit fit)
    {
        var fitted = new double[fit.Store.Residuals.Count];
        foreach (var block in fit.Design.Blocks())
        {
            Fill(fit, block, fitted.AsSpan(block.FirstRow, block.Rows));
        }

        return fitted;
    }

    /// <summary>X b for the rows of the block, on the response's scale.</summary>
    internal static void Fill(CheckedFit fit, RowBlock block, Span<double> fitted)
    {
        fitted.Clear();
        for (var k = 0; k < fit.Fit.Columns.Count; k++)
        {
            BlockKernels.AddScaled(fitted, fit.Fit.Coefficients[k], block.Column(fit.Fit.Columns[k]));
        }
    }
}
