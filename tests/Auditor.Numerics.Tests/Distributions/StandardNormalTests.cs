using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Tests.Distributions;

/// <summary>Against 80-digit values: values/make_values.py.</summary>
public sealed class StandardNormalTests
{
    [Fact]
    public void Upper_tail_agrees_with_high_precision_values() =>
        ValueFile.AllClose(ValueFile.Rows("standard_normal.csv", 500), "upper_tail", r => StandardNormal.UpperTail(r.Number("z")));

    [Fact]
    public void Quantile_agrees_with_high_precision_inverses() =>
        ValueFile.AllClose(ValueFile.Rows("standard_normal_quantile.csv", 400), "z", r => StandardNormal.Quantile(r.Number("p")));
}
