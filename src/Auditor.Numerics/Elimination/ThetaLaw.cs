using Auditor.Numerics.Distributions;

namespace Auditor.Numerics.Elimination;

/// <summary>The law of theta when the group has no effect and errors are normal with equal variance: tan² theta df2/df1 follows F(df1, df2).</summary>
internal sealed class ThetaLaw(double df1, double df2)
{
    /// <summary>Log probability to which the grid's tails go, below that of the observed theta where it is smaller.</summary>
    private static readonly double TailTo = Math.Log(1e-12);

    private const int Bulk = 400;
    private const double NodeStep = 1;
    private const int Between = 4;
    private const int Doublings = 10;

    public double Statistic(double tangent) => tangent * tangent * df2 / df1;

    public double LogUpper(double tangent) => FisherF.LogSurvival(Statistic(tangent), df1, df2);

    /// <summary>Log of the probability between two tangents, from the tail in which it keeps its digits; minus infinity when it is 0.</summary>
    public double LogBetween(double from, double to)
    {
        var (upperFrom, upperTo) = (LogUpper(from), double.IsPositiveInfinity(to) ? double.NegativeInfinity : LogUpper(to));
        if (upperFrom < -Math.Log(2))
        {
            return LogDifference(upperFrom, upperTo);
        }

        var lowerFrom = Math.Log(FisherF.Cumulative(Statistic(from), df1, df2));
        var lowerTo = double.IsPositiveInfinity(to) ? 0 : upperTo < -Math.Log(2) ? LogDifference(0, upperTo) : Math.Log(FisherF.Cumulative(Statistic(to), df1, df2));
        return LogDifference(lowerTo, lowerFrom);
    }

    /// <summary>
    /// Tangents in ascending order: 400 equal steps of probability, then equal steps of its logit into both tails, to 1e-12 of the tail and to 1e-12 of what lies
    /// beyond the observed theta, and that theta itself. Between nodes the quantile is interpolated: a grid need not be exact.
    /// </summary>
    public double[] Grid(double observed)
    {
        var least = TailTo + Math.Min(0, Math.Log(FisherF.Cumulative(Statistic(observed), df1, df2)));
        var most = -TailTo - Math.Min(0, LogUpper(observed));
        var nodes = Nodes(least, most);
        var bulk = Enumerable.Range(0, Bulk).Select(i => Logit((i + 0.5) / Bulk));
        var tails = Enumerable.Range(0, nodes.Count - 1).SelectMany(i => Enumerable.Range(0, Between).Select(k => nodes[i].Logit + (k * (nodes[i + 1].Logit - nodes[i].Logit) / Between)));
        var around = Enumerable.Range(0, Doublings).Select(k => Math.ScaleB(observed, k));
        return [.. bulk.Concat(tails).Where(logit => logit >= nodes[0].Logit && logit <= nodes[^1].Logit)
            .Select(logit => Math.Exp(Interpolated(nodes, logit) / 2)).Concat(around).Where(x => x > 0 && double.IsFinite(x)).Distinct().Order()];
    }

    private static double Logit(double p) => Math.Log(p / (1 - p));

    /// <summary>log(e^a - e^b), b at most a.</summary>
    private static double LogDifference(double a, double b) =>
        b >= a ? double.NegativeInfinity : a + Deviance.LogComplement(b - a);

    /// <summary>Logits with the log of tan² theta there. Steps widen with the distance from the middle, so that a far tail costs little.</summary>
    private List<(double Logit, double LogSquare)> Nodes(double least, double most)
    {
        var nodes = new List<(double, double)>();
        for (var logit = least; logit < most + NodeStep; logit += NodeStep * Math.Max(1, Math.Abs(logit) / 30))
        {
            var upper = 1 / (1 + Math.Exp(logit));
            var f = logit <= 700 && upper > 0 ? FisherF.UpperQuantile(upper, df1, df2) : double.PositiveInfinity;
            if (f > 0 && double.IsFinite(f))
            {
                nodes.Add((logit, Math.Log(f * df1 / df2)));
            }
        }

        return nodes;
    }

    private static double Interpolated(List<(double Logit, double LogSquare)> nodes, double logit)
    {
        var above = nodes.FindIndex(node => node.Logit >= logit);
        if (above <= 0)
        {
            return nodes[Math.Max(above, 0)].LogSquare;
        }

        var (low, high) = (nodes[above - 1], nodes[above]);
        return low.LogSquare + ((high.LogSquare - low.LogSquare) * (logit - low.Logit) / (high.Logit - low.Logit));
    }
}
