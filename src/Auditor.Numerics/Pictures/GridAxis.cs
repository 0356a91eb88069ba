namespace Auditor.Numerics.Pictures;

/// <summary>An even number of equal cells over a range that can double to either side.</summary>
internal sealed class GridAxis
{
    private const double NarrowestRange = 1e-9;

    private readonly int _cells;
    private double _low;
    private double _width;

    private GridAxis(double low, double width, int cells) => (_low, _width, _cells) = (low, width, cells);

    private double High => _low + (_cells * _width);

    /// <summary>Covers all values; a range too narrow to divide is widened.</summary>
    public static GridAxis Covering(IReadOnlyCollection<double> values, int cells)
    {
        var (low, high) = (values.Min(), values.Max());
        var narrowest = Math.Max(Math.Abs(low), Math.Abs(high)) * NarrowestRange;
        var range = Math.Max(high - low, narrowest > 0 ? narrowest : 1);
        return new GridAxis(low, range / cells, cells);
    }

    /// <summary>-1 below the range, 1 above it, 0 within.</summary>
    public int Outside(double value) => value < _low ? -1 : value > High ? 1 : 0;

    /// <summary>Doubles the range to one side; says to which of the new cells each old one goes.</summary>
    public Func<int, int> Double(int side)
    {
        if (side < 0)
        {
            _low -= _cells * _width;
        }

        _width *= 2;
        return side < 0 ? old => (_cells + old) / 2 : old => old / 2;
    }

    public int Index(double value) => (int)Math.Clamp((value - _low) / _width, 0, _cells - 1);
}
