using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics.ResidualChecks;
using Auditor.Policies;
using Auditor.Rows;

namespace Auditor.Analysis;

/// <summary>
/// The fits of an audit, one for each distinct row set: the final model's own rows, each group's own rows, the rows common to all. Groups with one
/// missing pattern share a factor.
/// </summary>
internal sealed class ModelFits
{
    private readonly Dictionary<RowSubset, RowSetFit> _fits = [];

    private ModelFits(RowSelection selection) => Selection = selection;

    public RowSelection Selection { get; }

    /// <summary>Residual and leverage of every row of the fit that is shown.</summary>
    public required ResidualStore Residuals { get; init; }

    /// <summary>The final model on the rows complete for it alone.</summary>
    public RowSetFit? Final => On(Selection.Final);

    /// <summary>The final model and all groups on the rows complete for everything; null when there is no such row.</summary>
    public RowSetFit? Common => On(Selection.Common);

    /// <param name="main">The rows of the fit that is shown and checked: their residuals are kept.</param>
    /// <param name="pictured">The rows on which each group's pictures are drawn; null when none are wanted.</param>
    /// <param name="scored">Whether robust covariances of the final model's own coefficients are wanted.</param>
    /// <param name="run">Its threads are for row sets, then within each; no result depends on them.</param>
    public static ModelFits Compute(BoundModel model, RowSelection selection, RowSubset main, RowSet? pictured, bool scored, RunSettings run)
    {
        var residuals = new ResidualStore(main.Count, run.Store);
        IReadOnlySet<int> Pictured(RowSubset rows) => Enumerable.Range(0, model.Groups.Count)
            .Where(group => pictured is RowSet set && rows.Equals(set == RowSet.Common ? selection.Common : selection.Own[group])).ToHashSet();

        FitWishes Wishes(RowSubset rows) => new(
            rows.Equals(selection.Common),
            rows.Equals(main) ? residuals : null,
            Pictured(rows),
            scored && (rows.Equals(selection.Final) || rows.Equals(selection.Common)),
            run.Seed);

        var wanted = Wanted(model, selection).Where(entry => entry.Key.Count > 0).ToArray();
        var computed = new RowSetFit[wanted.Length];
        Parallel.For(
            0,
            wanted.Length,
            new ParallelOptions { MaxDegreeOfParallelism = run.Threads },
            at => computed[at] = RowSetFit.Compute(model, wanted[at].Key, [.. wanted[at].Value], Wishes(wanted[at].Key), Math.Max(1, run.Threads / wanted.Length)));
        var fits = new ModelFits(selection) { Residuals = residuals };
        foreach (var fit in computed)
        {
            fits._fits[fit.Rows] = fit;
        }

        return fits;
    }

    /// <summary>The fit of a group's own rows; null when it has none.</summary>
    public RowSetFit? Own(int group) => On(Selection.Own[group]);

    /// <summary>The groups to be tested on each distinct row set.</summary>
    private static Dictionary<RowSubset, SortedSet<int>> Wanted(BoundModel model, RowSelection selection)
    {
        var wanted = new Dictionary<RowSubset, SortedSet<int>> { [selection.Final] = [] };
        wanted.TryAdd(selection.Common, []);
        for (var g = 0; g < model.Groups.Count; g++)
        {
            wanted.TryAdd(selection.Own[g], []);
            wanted[selection.Own[g]].Add(g);
            wanted[selection.Common].Add(g);
        }

        return wanted;
    }

    private RowSetFit? On(RowSubset rows) => _fits.GetValueOrDefault(rows);
}
