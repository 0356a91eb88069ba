using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis.Parts;

/// <summary>
/// The final model and the groups fitted in each part of one division: one factor and one second pass for all groups that share a part's rows, never one for a group.
/// </summary>
internal sealed class PartFits
{
    private readonly Dictionary<RowSubset, RowSetFit> _fits = [];
    private readonly Dictionary<(RowSetFit, SummedOver), int[]> _codes = [];
    private readonly RowSubset[,] _rows;

    private PartFits(BoundModel model, RowSubset[,] rows) => (Model, _rows) = (model, rows);

    public BoundModel Model { get; }

    /// <param name="groupRows">Rows of each group's own test; null: it has none.</param>
    /// <param name="leastRows">Parts with fewer rows are not fitted.</param>
    /// <param name="run">Its threads are for parts, then within each; no result depends on them.</param>
    public static PartFits Compute(BoundModel model, Division division, IReadOnlyList<RowSubset?> groupRows, int leastRows, RunSettings run)
    {
        var parts = division.Parts.Count;
        var rows = new RowSubset[parts, groupRows.Count];
        var wanted = new OrderedDictionary<RowSubset, List<int>>();
        for (var part = 0; part < parts; part++)
        {
            foreach (var same in groupRows.Index().GroupBy(group => group.Item))
            {
                var here = same.Key is { } all ? division.Parts[part].Of(all) : new RowSubset([]);
                foreach (var (group, _) in same)
                {
                    rows[part, group] = here;
                }

                if (here.Count >= Math.Max(1, leastRows))
                {
                    wanted.TryAdd(here, []);
                    wanted[here].AddRange(same.Select(group => group.Index));
                }
            }
        }

        var fits = new PartFits(model, rows);
        foreach (var fit in Fitted(model, wanted, run, 2 * new DependenceStructure().MostDoubles / parts))
        {
            fits._fits[fit.Rows] = fit;
        }

        return fits;
    }

    public RowSubset Rows(int part, int group) => _rows[part, group];

    /// <summary>Null when the part has too few rows of the group.</summary>
    public RowSetFit? Of(int part, int group) => _fits.GetValueOrDefault(_rows[part, group]);

    /// <summary>The class in the whole table of each class of a fit's rows.</summary>
    /// <param name="over">One kind of class.</param>
    public int[] Codes(RowSetFit fit, SummedOver over)
    {
        if (!_codes.TryGetValue((fit, over), out var codes))
        {
            var classes = over switch
            {
                SummedOver.Cluster => Model.Structure.Clusters!,
                SummedOver.Unit => Model.Structure.Units!,
                _ => Model.Structure.Time!.Periods,
            };
            _codes[(fit, over)] = codes = [.. fit.Rows.Select(row => classes[row]).Distinct().Order()];
        }

        return codes;
    }

    private static RowSetFit[] Fitted(BoundModel model, OrderedDictionary<RowSubset, List<int>> wanted, RunSettings run, long mostDoubles)
    {
        var computed = new RowSetFit[wanted.Count];
        var wishes = new FitWishes(Jointly: false, null, new HashSet<int>(), Scored: false, run.Seed) { MostDoubles = mostDoubles };
        Parallel.For(
            0,
            wanted.Count,
            new ParallelOptions { MaxDegreeOfParallelism = run.Threads },
            at => computed[at] = RowSetFit.Compute(model, wanted.GetAt(at).Key, [.. wanted.GetAt(at).Value.Order()], wishes, Math.Max(1, run.Threads / wanted.Count)));
        return computed;
    }
}
