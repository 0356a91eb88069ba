using Auditor.Data;
using Auditor.Design;
using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.ResidualChecks;
using Auditor.Numerics.SecondPass;
using Auditor.Results;

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

    /// <summary>Sums for robust covariances of the final model's own coefficients; null when they were not asked for.</summary>
    public CoefficientScores? Scores { get; private set; }

    /// <summary>The same by declared cluster; null also when none is declared.</summary>
    public CoefficientClassScores? ClusterScores { get; private set; }

    /// <summary>The same by period, where a lag is declared.</summary>
    public CoefficientClassScores? PeriodScores { get; private set; }

    /// <summary>The declared lag.</summary>
    public int? SerialLag { get; private set; }

    public GroupFit this[int group] => _groups[group];

    /// <param name="groups">Positions of the groups to be tested on these rows.</param>
    /// <param name="wishes">What is wanted beside the fit and the groups' own tests.</param>
    /// <param name="threads">Most threads to use; no result depends on it.</param>
    public static RowSetFit Compute(BoundModel model, RowSubset rows, IReadOnlyList<int> groups, FitWishes wishes, int threads)
    {
        var plan = new DesignPlan(model, groups);
        var design = new DesignRows(model, plan, rows);
        var final = FinalFactor.Of(FactorBuilder.Build(design, threads));
        var added = plan.Layout.Groups.Select(range => AddedGroup.Of(final, [.. range.Indices])).ToList();
        var joint = wishes.Jointly && groups.Count > 0 ? AddedGroup.Of(final, Columns(plan, [.. Enumerable.Range(0, groups.Count)])) : null;
        var pictures = groups.Select((group, g) => wishes.Pictured.Contains(group) ? GroupPictures.Of(added[g], plan, model.Groups.Count) : null).ToList();
        var scores = wishes.Scored ? new CoefficientScores(final) : null;
        var dependence = Dependence.Of(model.Structure, model.Structure.Among(rows), wishes.Seed).Within(wishes.MostDoubles);
        var byCluster = wishes.Scored && dependence.Rows?.Cluster is { } clusters ? CoefficientClassScores.Of(final, clusters) : null;
        var byPeriod = wishes.Scored && dependence is { SerialLag: not null, Rows.Period: { } periods } ? CoefficientClassScores.Of(final, periods) : null;
        IAccumulator?[] others = [wishes.Residuals, scores, byCluster, byPeriod, .. pictures.SelectMany(picture => picture?.Accumulators ?? [])];
        var pass = RowPass.Run(design, final, joint is null ? added : [.. added, joint], [.. others.OfType<IAccumulator>()], dependence.Rows, threads);
        var result = new RowSetFit(rows, plan, final, new Fit(final, pass)) { Scores = scores, ClusterScores = byCluster, PeriodScores = byPeriod, SerialLag = dependence.SerialLag };
        var last = joint is null ? null : LastIn.Of(final, [.. added.Select(group => group.Columns)], threads);
        for (var g = 0; g < groups.Count; g++)
        {
            result._groups[groups[g]] = new GroupFit(model.Groups[groups[g]].Declared.Name, added[g], pass.Groups[g], last?[g], joint, dependence) { Plots = pictures[g]?.Plots() };
        }

        result.Joint = joint is null ? null : new GroupFit(AllLeftOut.Name, joint, pass.Groups[^1], null, null, dependence);
        return result;
    }

    private static int[] Columns(DesignPlan plan, IReadOnlyList<int> groups) =>
        [.. groups.SelectMany(group => plan.Layout.Groups[group].Indices)];
}

/// <summary>One group (or union) on one row set.</summary>
/// <param name="Name">The group's, or that of all groups together.</param>
/// <param name="LastIn">The group added after all others; null when the others are not on these rows.</param>
/// <param name="Largest">All groups added at once; null likewise.</param>
/// <param name="Dependence">What is declared of the dependence between these rows.</param>
internal sealed record GroupFit(string Name, AddedGroup Added, GroupSums Sums, AddedGroup? LastIn, AddedGroup? Largest, Dependence Dependence)
{
    /// <summary>Null when they were not asked for on these rows or cannot be drawn.</summary>
    public GroupPlots? Plots { get; init; }
}

/// <summary>What is wanted of a row set beside the fit and the groups' own tests.</summary>
/// <param name="Jointly">All groups together, and each last.</param>
/// <param name="Residuals">Keeps every row's residual and leverage; null when they are not wanted.</param>
/// <param name="Pictured">Groups whose pictures show these rows.</param>
/// <param name="Scored">Robust covariances of the coefficients.</param>
/// <param name="Seed">Seed of everything drawn at random.</param>
internal sealed record FitWishes(bool Jointly, ResidualStore? Residuals, IReadOnlySet<int> Pictured, bool Scored, long Seed)
{
    /// <summary>Doubles that sums by class may take; null: as many as usual.</summary>
    public long? MostDoubles { get; init; }
}
