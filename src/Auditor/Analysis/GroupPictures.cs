using Auditor.Design;
using Auditor.Numerics.Factor;
using Auditor.Numerics.Pictures;
using Auditor.Numerics.SecondPass;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Gathers the pictures of one group while the second pass runs: what the group adds, and some of its columns.</summary>
internal sealed class GroupPictures
{
    private const int Alone = 300;
    private const int MostGroups = 200;
    private const int MostColumns = 3;
    private const int MostColumnsOfAll = 120;

    /// <summary>Beyond this, differences and squares of coordinates would overflow.</summary>
    private const double Largest = 1e150;

    private readonly AddedGroup _group;
    private readonly DesignPlan _plan;
    private readonly AddedVariable _added;
    private readonly IReadOnlyList<ResidualsAgainstColumn> _columns;

    /// <summary>Null when there are too many groups to draw each; of many only what the group adds, so that the page stays one that opens.</summary>
    /// <param name="groups">How many groups the model has.</param>
    public static GroupPictures? Of(AddedGroup group, DesignPlan plan, int groups) =>
        groups > MostGroups ? null : new GroupPictures(group, plan, Math.Min(MostColumns, MostColumnsOfAll / groups));

    private GroupPictures(AddedGroup group, DesignPlan plan, int columns)
    {
        _group = group;
        _plan = plan;
        _added = new AddedVariable(group, Alone);
        _columns = [.. group.Columns.Take(columns).Select(column => new ResidualsAgainstColumn(column, Alone))];
    }

    public IEnumerable<IAccumulator> Accumulators => [_added, .. _columns];

    /// <summary>Null when the group adds nothing or the numbers are too large to draw.</summary>
    public GroupPlots? Plots()
    {
        var clouds = _columns.Select(column => column.Points).Append(_added.Points);
        if (_group.Rank == 0 || clouds.Any(cloud => cloud.Points.Any(point => Math.Abs(point.X) > Largest || Math.Abs(point.Y) > Largest)))
        {
            return null;
        }

        return new GroupPlots(
            new AddedVariablePlot(PointClouds.Of(_added.Points, trend: false), _added.Slope, _added.OneColumn ? _plan.Labels[_group.Kept[0]] : null),
            [.. _columns.Select(column => new ColumnPlot(_plan.Labels[column.Column], PointClouds.Of(column.Points, trend: true)))],
            _group.Columns.Count - _columns.Count);
    }
}
