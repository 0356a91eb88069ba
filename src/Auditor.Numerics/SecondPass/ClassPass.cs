using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>Collects the sums of all groups by one kind of class.</summary>
internal sealed class ClassPass
{
    private readonly ClassWindow _window;
    private readonly FinalRows _rows;
    private readonly FinalMoments? _final;
    private readonly ClassMoments[] _moments;
    private readonly ClassSums[] _sums;
    private bool _first = true;

    /// <param name="capacity">Rows of a block.</param>
    /// <param name="clusters">Whether the final model's own sums are wanted, as the forms over clusters do.</param>
    public ClassPass(RowClasses classes, FinalFactor final, IReadOnlyList<AddedGroup> groups, int capacity, bool clusters, long mostDoubles)
    {
        if (classes.Codes.Length != final.Factor.Totals.Rows)
        {
            throw new ArgumentException("every row of the row set has one class", nameof(classes));
        }

        _window = new ClassWindow(classes, groups.Sum(ClassMoments.Size), mostDoubles);
        _rows = new FinalRows(capacity, final.Rank);
        _final = clusters && FinalMoments.Fit(classes, final.Rank) ? new FinalMoments(classes, final.Rank) : null;
        _moments = [.. groups.Select(group => new ClassMoments(_window, group))];
        _sums = [.. groups.Select(group => new ClassSums(classes, group) { Final = _final })];
    }

    public IReadOnlyList<ClassSums> Sums => _sums;

    /// <summary>To be called for each block before the groups' rows.</summary>
    public void Add(ResidualBlock block)
    {
        _rows.Load(block);
        if (_first)
        {
            _final?.Add(block, _rows);
        }
    }

    public void Add(ResidualBlock block, int group, GroupRows rows) => _moments[group].Add(block, _rows, rows);

    /// <summary>To be called after each pass over the rows.</summary>
    /// <returns>Whether another pass is needed.</returns>
    public bool Close()
    {
        _first = false;
        for (var g = 0; g < _sums.Length; g++)
        {
            _sums[g].Take(_window, _moments[g]);
        }

        var more = _window.Next();
        if (more)
        {
            Array.ForEach(_moments, moments => moments.Clear());
        }

        return more;
    }
}
