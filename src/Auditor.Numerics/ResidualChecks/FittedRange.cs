using Auditor.Numerics.Factor;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Least and greatest fitted value over the rows. Powers are formed of (fitted - centre) / scale, so that large responses lose no digits.</summary>
/// <param name="Centre">0 without an intercept: moving the fitted value would then change the columns' span.</param>
/// <param name="HalfWidth">Half of greatest less least.</param>
internal sealed record FittedRange(double Centre, double Scale, double HalfWidth)
{
    public static FittedRange Of(IDesignRows design, Fit fit)
    {
        var (least, greatest) = (double.PositiveInfinity, double.NegativeInfinity);
        var values = Array.Empty<double>();
        foreach (var block in design.Blocks())
        {
            values = values.Length < block.Stride ? new double[block.Stride] : values;
            FittedValues.Fill(fit, block, values.AsSpan(0, block.Rows));
            (least, greatest) = BlockKernels.Range(values.AsSpan(0, block.Rows), least, greatest);
        }

        var half = (greatest - least) / 2;
        return design.Layout.Intercept
            ? new FittedRange((least + greatest) / 2, half, half)
            : new FittedRange(0, Math.Max(Math.Abs(least), Math.Abs(greatest)), half);
    }
}
