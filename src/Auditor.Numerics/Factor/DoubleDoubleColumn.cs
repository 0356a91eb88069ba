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
    public void Renormalise()
    {
        for (var i = 0; i < _length; i++)
        {
            this[i] += DoubleDouble.Of(0);
        }
    }

    public DoubleDouble Sum()
    {
        var total = DoubleDouble.Of(0);
        for (var i = 0; i < _length; i++)
        {
            total += this[i];
        }

        return total;
    }

    /// <summary>Sum of value times double-double.</summary>
    public DoubleDouble Dot(ReadOnlySpan<double> values)
    {
        var total = DoubleDouble.Of(0);
        for (var i = 0; i < _length; i++)
        {
            total += this[i] * values[i];
        }

        return total;
    }

    /// <summary>Sum of products, the other one's low parts to first order.</summary>
    public DoubleDouble Dot(DoubleDoubleColumn other)
    {
        var total = DoubleDouble.Of(0);
        for (var i = 0; i < _length; i++)
        {
            total += this[i] * other._high[i];
            total += DoubleDouble.Of(_high[i] * other._low[i]);
        }

        return total;
    }
}
