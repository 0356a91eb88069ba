using Auditor.Numerics.Factor;

namespace Auditor.Numerics.SecondPass;

/// <summary>All that the second pass collects for clustered and serially dependent errors.</summary>
internal sealed class DependencePass
{
    private readonly FinalFactor _final;
    private readonly IReadOnlyList<AddedGroup> _groups;
    private readonly Dictionary<int, GroupRows> _rows;
    private readonly (ClassPass? Cluster, ClassPass? Unit, ClassPass? Period) _by;
    private readonly (ColumnLevels? Cluster, ColumnLevels? Unit, ColumnLevels? Period) _levels;

    public DependencePass(FinalFactor final, IReadOnlyList<AddedGroup> groups, DependenceStructure structure, int capacity)
    {
        (_final, _groups) = (final, groups);
        _rows = groups.Select(group => group.Rank).Distinct().ToDictionary(rank => rank, rank => new GroupRows(rank, capacity));
        ClassPass? By(RowClasses? classes, bool clusters) =>
            classes is null ? null : new ClassPass(classes, final, groups, capacity, clusters, structure.MostDoubles);
        var cluster = By(structure.Cluster, clusters: true);
        var sameUnit = ReferenceEquals(structure.Unit, structure.Cluster);
        _by = (cluster, sameUnit ? cluster : By(structure.Unit, clusters: true), By(structure.Period, clusters: false));

        int[] columns = [.. groups.SelectMany(group => group.Kept).Distinct()];
        ColumnLevels? Levels(RowClasses? classes) => classes is null ? null : new ColumnLevels(classes, columns);
        var clusterLevels = Levels(structure.Cluster);
        _levels = (clusterLevels, sameUnit ? clusterLevels : Levels(structure.Unit), Levels(structure.Period));
    }

    private IEnumerable<ClassPass> Passes => new[] { _by.Cluster, _by.Unit, _by.Period }.OfType<ClassPass>().Distinct();

    /// <param name="raw">The block as declared, for the level on which columns vary.</param>
    public void Add(RowBlock raw, ResidualBlock block)
    {
        foreach (var levels in new[] { _levels.Cluster, _levels.Unit, _levels.Period }.OfType<ColumnLevels>().Distinct())
        {
            levels.Add(raw);
        }

        Add(block, Passes);
    }

    /// <summary>Goes over the rows again as long as some class's sums have not been collected, then hands the sums over.</summary>
    public void Finish(IDesignRows design, IReadOnlyList<GroupSums> into)
    {
        for (var open = StillOpen(Passes); open.Length > 0; open = StillOpen(open))
        {
            PassAgain(design, open);
        }

        for (var g = 0; g < into.Count; g++)
        {
            (into[g].Cluster, into[g].Unit, into[g].Period) = (_by.Cluster?.Sums[g], _by.Unit?.Sums[g], _by.Period?.Sums[g]);
            var kept = _groups[g].Kept;
            into[g].Levels = new LevelCounts(
                kept.Count, _levels.Period?.Constant(kept), _levels.Unit?.Constant(kept), _levels.Cluster?.Constant(kept));
        }
    }

    private static ClassPass[] StillOpen(IEnumerable<ClassPass> passes) => [.. passes.ToArray().Where(pass => pass.Close())];

    private void PassAgain(IDesignRows design, ClassPass[] passes)
    {
        var refinement = new Refinement(_final);
        ResidualBlock? residuals = null;
        foreach (var block in design.Blocks())
        {
            residuals ??= new ResidualBlock(_final, block.Stride);
            refinement.Add(block);
            residuals.Load(block, refinement.Residuals);
            Add(residuals, passes);
        }
    }

    private void Add(ResidualBlock block, IEnumerable<ClassPass> passes)
    {
        ClassPass[] all = [.. passes];
        Array.ForEach(all, pass => pass.Add(block));
        for (var g = 0; g < _groups.Count; g++)
        {
            var rows = _rows[_groups[g].Rank];
            rows.Load(block, _groups[g]);
            foreach (var pass in all)
            {
                pass.Add(block, g, rows);
            }
        }
    }
}

/// <summary>How many of a group's columns that add a direction are constant within each class; null where the classes were not declared.</summary>
/// <param name="Columns">All of them.</param>
public sealed record LevelCounts(int Columns, int? ConstantWithinPeriod, int? ConstantWithinUnit, int? ConstantWithinCluster);
