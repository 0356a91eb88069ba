using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Fitted values of the final model.</summary>
public static class FittedValues
{
    /// <summary>X b of the rows at some positions, rising, on the response's scale.</summary>
    public static double[] Of(CheckedFit fit, IReadOnlyList<int> positions)
    {
        var (fitted, values, next) = (new double[positions.Count], Array.Empty<double>(), 0);
        foreach (var block in fit.Design.Blocks())
        {
            values = values.Length < block.Stride ? new double[block.Stride] : values;
            Fill(fit.Fit, block, values.AsSpan(0, block.Rows));
            for (; next < positions.Count && positions[next] < block.FirstRow + block.Rows; next++)
            {
                fitted[next] = values[positions[next] - block.FirstRow];
            }
        }

        return fitted;
    }

    /// <summary>X b for the rows of the block, on the response's scale.</summary>
    internal static void Fill(Fit fit, RowBlock block, Span<double> fitted)
    {
        fitted.Clear();
        for (var k = 0; k < fit.Columns.Count; k++)
        {
            BlockKernels.AddScaled(fitted, fit.Coefficients[k], block.Column(fit.Columns[k]));
        }
    }

    /// <summary>The same, centred and scaled to lie between -1 and 1.</summary>
    internal static void FillScaled(CheckedFit fit, RowBlock block, Span<double> fitted)
    {
        Fill(fit.Fit, block, fitted);
        var range = fit.FittedRange;
        foreach (ref var value in fitted)
        {
            value = (value - range.Centre) / range.Scale;
        }
    }
}
