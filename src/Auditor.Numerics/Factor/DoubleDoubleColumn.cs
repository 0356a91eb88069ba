namespace Auditor.Numerics.Factor;

/// <summary>A column of double-doubles, high and low parts apart; its length is that of what was last loaded.</summary>
internal sealed class DoubleDoubleColumn
{
    private double[] _high = [];
    private double[] _low = [];
    private int _length;

    public Span<double> High => _high.AsSpan(0, _length);

    public Span<double> Low => _low.AsSpan(0, _length);

    public DoubleDouble this[int i]
    {
        get => new(_high[i], _low[i]);
        set => (_high[i], _low[i]) = (value.High, value.Low);
    }

    public void Load(ReadOnlySpan<double> values)
    {
        _length = values.Length;
        if (_high.Length < _length)
        {
            (_high, _low) = (new double[_length], new double[_length]);
        }

        values.CopyTo(High);
        Low.Clear();
    }

    /// <summary>Makes every low part smaller than half the last place of its high part.</summary>
    public void Renormalise() => DoubleDoubleKernels.Renormalise(High, Low);

    public DoubleDouble Sum() => DoubleDoubleKernels.Sum(High, Low);

    /// <summary>Sum of value times double-double.</summary>
    public DoubleDouble Dot(ReadOnlySpan<double> values) => DoubleDoubleKernels.Dot(High, Low, values);

    /// <summary>Sum of products, the other one's low parts to first order.</summary>
    public DoubleDouble Dot(DoubleDoubleColumn other) => Dot(other.High) + DoubleDouble.Of(BlockKernels.Dot(High, other.Low));
}
