using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Fitted values of the final model.</summary>
internal static class FittedValues
{
    /// <summary>X b for the rows of the block, on the response's scale.</summary>
    public static void Fill(CheckedFit fit, RowBlock block, Span<double> fitted)
    {
        fitted.Clear();
        for (var k = 0; k < fit.Fit.Columns.Count; k++)
        {
            BlockKernels.AddScaled(fitted, fit.Fit.Coefficients[k], block.Column(fit.Fit.Columns[k]));
        }
    }
}
