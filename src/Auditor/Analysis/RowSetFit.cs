using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis;

/// <summary>Everything computed on one row set: one factor, one second pass, the final model's fit and the groups that are tested on these rows.</summary>
internal sealed class RowSetFit
{
    private readonly Dictionary<int, GroupFit> _groups = [];

    private RowSetFit(RowSubset rows, DesignPlan plan, FinalFactor final, Fit fit)
    {
        Rows = rows;
        Plan = plan;
        Final = final;
        Fit = fit;
    }

    public RowSubset Rows { get; }

    public DesignPlan Plan { get; }

    public FinalFactor Final { get; }

    public Fit Fit { get; }

    /// <summary>All groups of the plan added at once; null when they were not asked for jointly.</summary>
    public GroupFit? Joint { get; private set; }

    public GroupFit this[int group] => _groups[group];

    /// <param name="groups">Positions of the groups to be tested on these rows.</param>
    /// <param name="jointly">Whether all of them together, and each last, are wanted too.</param>
    /// <param name="residuals">Keeps every row's residual and leverage; null when they are not wanted.</param>
    /// <param name="threads">Most threads to use; no result depends on it.</param>
    public static RowSetFit Compute(BoundModel model, RowSubset rows, IReadOnlyList<int> groups, bool jointly, ResidualStore? residuals, int threads)
    {
        var plan = new DesignPlan(model, groups);
        var design = new DesignRows(model, plan, rows);
        var final = FinalFactor.Of(FactorBuilder.Build(design, threads));
        var added = plan.Layout.Groups.Select(range => AddedGroup.Of(final, [.. range.Indices])).ToList();
        var joint = jointly && groups.Count > 0 ? AddedGroup.Of(final, Columns(plan, [.. Enumerable.Range(0, groups.Count)])) : null;
        var pass = RowPass.Run(final.Factor.IsExtended ? design.Extended! : design, final, joint is null ? added : [.. added, joint], residuals is null ? [] : [residuals]);
        var result = new RowSetFit(rows, plan, final, new Fit(final, pass));
        for (var g = 0; g < groups.Count; g++)
        {
            var last = joint is null ? null : AddedGroup.After(final, Others(plan, g), added[g].Columns);
            result._groups[groups[g]] = new GroupFit(added[g], pass.Groups[g], last, joint);
        }

        result.Joint = joint is null ? null : new GroupFit(joint, pass.Groups[^1], null, null);
        return result;
    }

    private static int[] Others(DesignPlan plan, int group) =>
        Columns(plan, [.. Enumerable.Range(0, plan.Groups.Count).Where(other => other != group)]);

    private static int[] Columns(DesignPlan plan, IReadOnlyList<int> groups) =>
        [.. groups.SelectMany(group => plan.Layout.Groups[group].Indices)];
}

/// <summary>One group (or union) on one row set.</summary>
/// <param name="LastIn">The group added after all others; null when the others are not on these rows.</param>
/// <param name="Largest">All groups added at once; null likewise.</param>
internal sealed record GroupFit(AddedGroup Added, GroupSums Sums, AddedGroup? LastIn, AddedGroup? Largest);
