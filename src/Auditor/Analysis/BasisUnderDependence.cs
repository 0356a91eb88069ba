using Auditor.Numerics;
using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;
using Auditor.Numerics.SecondPass;

namespace Auditor.Analysis;

/// <summary>
/// The basis where dependence between rows is declared: the form over clusters when a cluster is declared, over periods when only time is; but a group whose
/// columns do not vary within a period (unit, cluster) carries no more observations than there are of these, so the form over them decides, whatever was declared.
/// </summary>
internal static class BasisUnderDependence
{
    /// <summary>Clusters by their own number or by the memory that the sums of all groups together take.</summary>
    private const string Cr1StandsIn =
        "; interval, power and the test for a negligible effect rest on CR1, because clusters and columns, over all groups together, are more than CR2 is computed for";

    /// <summary>Null when no declared dependence bears on the group.</summary>
    public static Basis? Of(GroupResults results)
    {
        if (results.Fit.Dependence.Rows is null || results.Dependence.Level is not { } level)
        {
            return null;
        }

        return level.Level switch
        {
            VariationLevel.Period => OnPeriods(results, "its columns do not vary within a period, so periods are what it is observed in"),
            VariationLevel.Cluster => OnClusters(results, results.Fit.Sums.Cluster!, "rows of a declared cluster may move together, and its columns do not vary within one"),
            VariationLevel.Unit => OnClusters(results, results.Fit.Sums.Unit!, "its columns do not vary within a unit, so units are what it is observed in"),
            VariationLevel.Mixture => OfMixture(results),
            _ => results.Fit.Dependence switch
            {
                { Clustered: true } => OnClusters(results, results.Fit.Sums.Cluster!, "a cluster is declared: its rows may move together"),
                { Timed: true } => OnPeriods(results, "a time order is declared: errors may carry over from one period to the next"),
                _ => null,
            },
        };
    }

    /// <summary>
    /// The larger p of the two forms; a form without a value leaves no other. It can reject only where both can, so its ceiling is the higher one; and the size of the
    /// effect is judged by the form that the data inform less.
    /// </summary>
    private static Basis OfMixture(GroupResults results)
    {
        const string reason = "its columns vary on different levels: of the forms over clusters or units and over periods the one with the larger p";
        var clusters = results.Fit.Sums.Cluster ?? results.Fit.Sums.Unit;
        if (clusters is null || results.Fit.Sums.Period is null)
        {
            return clusters is null ? OnPeriods(results, reason) : OnClusters(results, clusters, reason);
        }

        var (byCluster, byPeriod) = (OnClusters(results, clusters, reason), OnPeriods(results, reason));
        if (byPeriod.Test is NotComputable || byCluster.Test is NotComputable)
        {
            return byPeriod.Test is NotComputable ? byPeriod : byCluster;
        }

        var decides = byPeriod.Test.P >= byCluster.Test.P ? byPeriod : byCluster;
        var sizes = byPeriod.EffectiveRows is null || byPeriod.EffectiveRows.LeastInformed <= byCluster.EffectiveRows?.LeastInformed ? byPeriod : byCluster;
        return decides with
        {
            Over = byCluster.Over | byPeriod.Over,
            Reason = sizes.Reason,
            LeastDf = Least(byCluster.Wald?.Df2, byPeriod.Wald?.Df2),
            Ceiling = byPeriod.Ceiling?.P >= byCluster.Ceiling?.P ? byPeriod.Ceiling : byCluster.Ceiling,
            Unrestricted = sizes.Unrestricted,
            EffectiveRows = sizes.EffectiveRows,
            CountedIn = sizes.CountedIn,
            Needed = sizes.Needed,
        };
    }

    private static double? Least(double? one, double? other) => one is null || other < one ? other : one;

    private static Basis OnClusters(GroupResults results, ClassSums clusters, string reason)
    {
        var group = results.Fit.Added;
        var declared = ReferenceEquals(clusters, results.Fit.Sums.Cluster);
        var basis = new Basis(Basis.Cluster, reason, ClusterF.Of(group, clusters))
        {
            Unrestricted = TestResult.None(Impediment.SingularCovariance),
            CountedIn = Counted.Clusters,
            Sums = clusters.Count,
            Over = declared ? SummedOver.Cluster : SummedOver.Unit,
        };
        if (basis.Test is NotComputable)
        {
            return basis with { Unrestricted = basis.Test };
        }

        var cr2 = declared ? results.Dependence.Cr2! : Cr2.Of(group, clusters);
        var (test, covariance) = cr2.Test is NotComputable { Why: Impediment.TooManyClusters }
            ? (Cr1.Of(group, clusters), Cr1.Covariance(group, clusters))
            : (cr2.Test, cr2.Covariance);
        var rows = Worth(group, test, covariance);
        return basis with
        {
            Reason = cr2.Test is NotComputable { Why: Impediment.TooManyClusters } ? reason + Cr1StandsIn : reason,
            Unrestricted = test,
            EffectiveRows = rows,
            Ceiling = ClusterF.Ceiling(group, clusters),
            Needed = rows is null || test is not FTest f
                ? null
                : (bound, level, power) => Power.ClustersNeeded(f.Df1, cr2.Eta ?? f.Df2, clusters.Count, rows.LeastInformed, bound, level, power),
        };
    }

    private static Basis OnPeriods(GroupResults results, string reason)
    {
        var (group, periods) = (results.Fit.Added, results.Fit.Sums.Period!);
        var basis = new Basis(Basis.Time, reason, PeriodF.Of(group, periods))
        {
            Unrestricted = TestResult.None(Impediment.SingularCovariance),
            CountedIn = Counted.Periods,
            Sums = periods.Count,
            Over = SummedOver.Period,
        };
        if (basis.Test is NotComputable)
        {
            return basis with { Unrestricted = basis.Test };
        }

        var wald = results.Dependence.PeriodWald!;
        var rows = Worth(group, wald.Test, wald.Covariance);
        return basis with
        {
            Unrestricted = wald.Test,
            EffectiveRows = rows,
            Ceiling = PeriodF.Ceiling(group, periods),
            Needed = rows is null || wald.Test is not FTest f
                ? null
                : (bound, level, power) => Power.PeriodsNeeded(f.Df1, periods.Count, rows.LeastInformed, bound, level, power),
        };
    }

    /// <summary>Effective rows always by the classical residual degrees of freedom.</summary>
    private static EffectiveRows? Worth(AddedGroup group, TestResult test, double[,]? covariance)
    {
        var df2 = PartialF.ResidualDf(group);
        return test is FTest && covariance is not null ? EffectiveRows.Of(covariance, group.RssWith / df2, group.Rank, df2) : null;
    }
}
