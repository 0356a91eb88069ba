namespace Auditor.Numerics.Pictures;

/// <summary>
/// Points of a plane in bounded memory, however many there are: up to a limit each stands alone, beyond it the cells of a grid stand for those within,
/// at their mean. The grid's range doubles when a point falls outside, two cells becoming one, so one pass is enough and the result depends on the
/// order of the points alone.
/// </summary>
/// <param name="alone">Most points kept one by one.</param>
public sealed class PointGrid(int alone)
{
    private const int Across = 96;
    private const int Down = 64;

    private readonly List<GridPoint> _points = [];
    private Cells? _cells;

    /// <summary>How many observations all points stand for.</summary>
    public double Count { get; private set; }

    /// <summary>Whether points stand for cells.</summary>
    public bool Binned => _cells is not null;

    /// <summary>Single points in the order they came; or the cells that hold any, by row and column.</summary>
    public IReadOnlyList<GridPoint> Points => _cells is null ? _points : _cells.Filled;

    /// <summary>All points in runs of like x, each run at its mean: a column of cells, or a single point where none are binned. By x.</summary>
    public IReadOnlyList<GridPoint> Columns => _cells is null ? [.. _points.OrderBy(point => point.X)] : _cells.Columns;

    /// <param name="count">Equal observations at this place.</param>
    public void Add(double x, double y, double count)
    {
        Count += count;
        if (_cells is not null)
        {
            _cells.Add(x, y, count);
            return;
        }

        _points.Add(new GridPoint(x, y, count));
        if (_points.Count > alone)
        {
            _cells = new Cells(_points);
            _points.Clear();
        }
    }

    private sealed class Cells
    {
        private readonly GridAxis _x;
        private readonly GridAxis _y;
        private GridPoint[] _cells = new GridPoint[Across * Down];

        public Cells(List<GridPoint> points)
        {
            _x = GridAxis.Covering([.. points.Select(point => point.X)], Across);
            _y = GridAxis.Covering([.. points.Select(point => point.Y)], Down);
            foreach (var point in points)
            {
                Add(point.X, point.Y, point.Count);
            }
        }

        public IReadOnlyList<GridPoint> Filled => [.. _cells.Where(cell => cell.Count > 0)];

        public IReadOnlyList<GridPoint> Columns => [.. Enumerable.Range(0, Across).Select(Column).Where(column => column.Count > 0)];

        public void Add(double x, double y, double count)
        {
            while (_x.Outside(x) is not 0 and var side)
            {
                Merge(_x.Double(side), row => row);
            }

            while (_y.Outside(y) is not 0 and var side)
            {
                Merge(column => column, _y.Double(side));
            }

            ref var cell = ref _cells[(_y.Index(y) * Across) + _x.Index(x)];
            cell = cell.With(x, y, count);
        }

        private GridPoint Column(int column) => Enumerable.Range(0, Down).Aggregate(default(GridPoint), (sum, row) => sum.With(_cells[(row * Across) + column]));

        private void Merge(Func<int, int> column, Func<int, int> row)
        {
            var merged = new GridPoint[Across * Down];
            for (var at = 0; at < _cells.Length; at++)
            {
                ref var into = ref merged[(row(at / Across) * Across) + column(at % Across)];
                into = into.With(_cells[at]);
            }

            _cells = merged;
        }
    }
}

/// <param name="Count">How many observations the point stands for.</param>
public readonly record struct GridPoint(double X, double Y, double Count)
{
    internal GridPoint With(GridPoint other) => other.Count > 0 ? With(other.X, other.Y, other.Count) : this;

    internal GridPoint With(double x, double y, double count)
    {
        var total = Count + count;
        return new GridPoint(X + ((x - X) * (count / total)), Y + ((y - Y) * (count / total)), total);
    }
}
