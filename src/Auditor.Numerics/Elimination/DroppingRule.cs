using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Elimination;

public enum DroppingCriterion
{
    /// <summary>The largest p of the partial F tests, when it is above the bound.</summary>
    PartialF,

    /// <summary>The removal that lowers AIC most, when one does.</summary>
    Aic,

    /// <summary>The removal that lowers BIC most, when one does.</summary>
    Bic,
}

/// <summary>
/// One step of a backward elimination that puts nothing back. With D what unit u adds to the rest of the model M (df1 = the rank it adds, df2 = n - rank(M)):
/// F = (D/df1)/(RSS(M)/df2) and its p, or the change of the criterion on removal, n log(1 + D/RSS(M)) - c df1 with c = 2 (AIC) or log n (BIC).
/// </summary>
/// <remarks>
/// Equal values: the unit declared first. A unit that adds no rank has no test, and no model is changed by it: one that the reported model leaves out is dropped
/// at once, one that it keeps is not looked at until it adds something. Not thread-safe: critical values are kept.
/// </remarks>
public sealed class DroppingRule(DroppingCriterion criterion, double bound)
{
    /// <summary>Statistics closer than this, relative, are equal: rounding must not choose between them.</summary>
    private const double Tie = 1e-12;

    private readonly Dictionary<(int, double), double> _critical = [];

    public DroppingCriterion Criterion => criterion;

    /// <summary>The p above which a unit is dropped.</summary>
    public double Bound => bound;

    /// <summary>The unit that the rule drops from the model next; null when it stops.</summary>
    internal int? Next(Submodel model, Candidates candidates, ReadOnlySpan<double> t) =>
        WithoutInformation(model, candidates) ?? Tested(model, candidates, t);

    /// <summary>The same among the units that can be tested.</summary>
    internal int? Tested(Submodel model, Candidates candidates, ReadOnlySpan<double> t)
    {
        var (rss, df2) = (model.Residual.At(t), candidates.Observations - model.Rank);
        return df2 <= 0 ? null
            : criterion == DroppingCriterion.PartialF ? LargestP(model, rss, df2, t)
            : MostLowered(model, rss, candidates.Observations, t);
    }

    /// <summary>Change of AIC or BIC when a unit is removed.</summary>
    internal double Change(double sumOfSquares, int rank, double rss, double observations) =>
        (observations * Math.Log(1 + (sumOfSquares / rss))) - (rank * (criterion == DroppingCriterion.Aic ? 2 : Math.Log(observations)));

    private static int? WithoutInformation(Submodel model, Candidates candidates)
    {
        for (var unit = 0; unit < model.Added.Length; unit++)
        {
            if (model.Added[unit] is { Rank: 0 } && candidates.Units[unit].LeftOut)
            {
                return unit;
            }
        }

        return null;
    }

    /// <summary>Units that add the same rank are in the order of their F, so p is needed for one of each rank only, and only when it is above the bound.</summary>
    private int? LargestP(Submodel model, double rss, double df2, ReadOnlySpan<double> t)
    {
        var least = new SortedDictionary<int, (double F, int Unit)>();
        for (var unit = 0; unit < model.Added.Length; unit++)
        {
            if (model.Added[unit] is { Rank: > 0 } added)
            {
                var f = Statistic(added, rss, df2, t);
                if (f < Critical(added.Rank, df2) && (!least.TryGetValue(added.Rank, out var known) || f < known.F * (1 - Tie)))
                {
                    least[added.Rank] = (f, unit);
                }
            }
        }

        if (least.Count <= 1)
        {
            return least.Count == 0 ? null : least.First().Value.Unit;
        }

        var logs = least.Select(entry => (Log: FisherF.LogSurvival(entry.Value.F, entry.Key, df2), entry.Value.Unit)).ToList();
        var largest = logs.Max(one => one.Log);
        return logs.Where(one => one.Log >= largest - Tie).Min(one => one.Unit);
    }

    private int? MostLowered(Submodel model, double rss, double observations, ReadOnlySpan<double> t)
    {
        var (best, lowest) = ((int?)null, 0.0);
        for (var unit = 0; unit < model.Added.Length; unit++)
        {
            if (model.Added[unit] is { Rank: > 0 } added)
            {
                var change = Change(added.SumOfSquares.At(t), added.Rank, rss, observations);
                if (change < (best is null ? 0 : lowest - (Tie * (1 - lowest))))
                {
                    (best, lowest) = (unit, change);
                }
            }
        }

        return best;
    }

    /// <summary>Infinite where the model leaves nothing over.</summary>
    private static double Statistic(AddedUnit added, double rss, double df2, ReadOnlySpan<double> t)
    {
        var mean = added.SumOfSquares.At(t) / added.Rank;
        return rss > 0 ? mean / (rss / df2) : mean > 0 ? double.PositiveInfinity : 0;
    }

    /// <summary>F whose p is the bound.</summary>
    private double Critical(int df1, double df2)
    {
        if (!_critical.TryGetValue((df1, df2), out var critical))
        {
            _critical[(df1, df2)] = critical = FisherF.UpperQuantile(bound, df1, df2);
        }

        return critical;
    }
}
