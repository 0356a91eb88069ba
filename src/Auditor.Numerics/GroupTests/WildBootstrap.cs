using Auditor.Numerics.Distributions;
using Auditor.Numerics.Factor;
using Auditor.Numerics.Random;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Wild cluster bootstrap with the null imposed. Null: all coefficients of the group's columns in F + group are zero. Responses F b + v_c e(F) with one random
/// factor v_c a cluster, the CR1 Wald statistic of each; p is the share of statistics at least as large as the observed one. From 12 clusters v_c = ±1,
/// all 2^(C-1) patterns when they are not more than the draws; below, Webb's six points ±sqrt(1/2), ±1, ±sqrt(3/2). Errors of different clusters independent.
/// </summary>
/// <remarks>
/// Cameron, Gelbach and Miller 2008, Review of Economics and Statistics 90; Webb 2023, Canadian Journal of Economics 56 (from memory). Verified by brute force:
/// every pattern refitted. A draw works on the sums by cluster (C k q operations), never on the rows.
/// </remarks>
public sealed class WildBootstrap
{
    /// <summary>From this many clusters signs make enough patterns.</summary>
    public const int SignsFrom = 12;

    private const double MostWork = 5e10;

    /// <summary>Statistics that differ by rounding only are equal.</summary>
    private const double Tie = 1e-10;

    private static readonly double[] SixPoints = [-Math.Sqrt(1.5), -1, -Math.Sqrt(0.5), Math.Sqrt(0.5), 1, Math.Sqrt(1.5)];

    private readonly AddedGroup _group;
    private readonly ClassSums _clusters;
    private readonly double[] _factors;
    private readonly double[] _final;
    private readonly double[] _u;
    private readonly double[] _score;

    private WildBootstrap(AddedGroup group, ClassSums clusters)
    {
        (_group, _clusters) = (group, clusters);
        _factors = [.. Enumerable.Repeat(1.0, clusters.Count)];
        _final = new double[group.Final.Rank];
        _u = new double[group.Rank];
        _score = new double[group.Rank];
    }

    /// <param name="draws">Random draws, at least 1; more patterns than that are not enumerated.</param>
    /// <param name="alpha">The interval of p is at 1 - alpha.</param>
    /// <param name="random">A stream that belongs to this group and row set alone.</param>
    public static TestResult Of(AddedGroup group, ClassSums clusters, int draws, double alpha, Generator random)
    {
        if (Cr1.Of(group, clusters) is NotComputable none)
        {
            return none;
        }

        var work = (double)draws * clusters.Count * group.Rank * group.RankWith;
        if (clusters is not { Moments: not null, Final: not null } || work > MostWork)
        {
            return TestResult.None(Impediment.TooManyClusters);
        }

        // Without a statistic of the data nothing could be counted against it.
        var bootstrap = new WildBootstrap(group, clusters);
        if (bootstrap.Statistic() is not double observed)
        {
            return TestResult.None(Impediment.SingularCovariance);
        }

        var patterns = clusters.Count is >= SignsFrom and < 31 ? 1 << (clusters.Count - 1) : int.MaxValue;
        return patterns <= draws ? bootstrap.Enumerate(observed, patterns) : bootstrap.Draw(observed, draws, alpha, random);
    }

    private ResampledTest Enumerate(double observed, int patterns)
    {
        var atLeast = 0;
        for (var pattern = 0; pattern < patterns; pattern++)
        {
            // The first cluster keeps its sign: a pattern and its opposite give the same statistic.
            for (var c = 1; c < _factors.Length; c++)
            {
                _factors[c] = ((pattern >> (c - 1)) & 1) == 0 ? 1 : -1;
            }

            atLeast += Reaches(observed) ? 1 : 0;
        }

        var p = (double)atLeast / patterns;
        return new ResampledTest(p, p, p, atLeast, patterns, Exhaustive: true);
    }

    private ResampledTest Draw(double observed, int draws, double alpha, Generator random)
    {
        var atLeast = 0;
        for (var draw = 0; draw < draws; draw++)
        {
            foreach (ref var factor in _factors.AsSpan())
            {
                factor = _factors.Length >= SignsFrom ? (random.Uniform() < 0.5 ? -1 : 1) : SixPoints[(int)(6 * random.Uniform())];
            }

            atLeast += Reaches(observed) ? 1 : 0;
        }

        var interval = ClopperPearson.Of(atLeast, draws, alpha);
        return new ResampledTest((atLeast + 1.0) / (draws + 1), interval.Lower, interval.Upper, atLeast, draws, Exhaustive: false);
    }

    /// <summary>A draw whose covariance is singular counts against the group.</summary>
    private bool Reaches(double observed) => Statistic() is not double statistic || statistic >= observed * (1 - Tie);

    /// <summary>u*'V*^-1 u* but for CR1's constant factor; u* = sum v_c s_c, b*_c = v_c s_c - Qz_c' (Q_F m + Qz u*), m = sum v_c Q_Fc'e_c(F).</summary>
    private double? Statistic()
    {
        Array.Clear(_final);
        Array.Clear(_u);
        for (var c = 0; c < _factors.Length; c++)
        {
            BlockKernels.AddScaled(_final, _factors[c], _clusters.Final!.Scores(c));
            BlockKernels.AddScaled(_u, _factors[c], _clusters.Score(c));
        }

        return Quadratic.Form(_u, Quadratic.Products(_u.Length, _factors.Length, ResidualScore));
    }

    private ReadOnlySpan<double> ResidualScore(int code)
    {
        var moments = _clusters.Moments!;
        for (var a = 0; a < _group.Rank; a++)
        {
            _score[a] = (_factors[code] * _clusters.Score(code)[a])
                - BlockKernels.Dot(moments.Cross(code, a), _final) - BlockKernels.Dot(moments.Squares(code, a), _u);
        }

        return _score;
    }
}

/// <summary>A p-value from resampling.</summary>
/// <param name="Probability">(b + 1)/(B + 1) from B draws with b at least as large as the observed statistic; b/B when all patterns were tried.</param>
/// <param name="Lower">Lower limit of its Clopper–Pearson interval; p itself when all patterns were tried.</param>
/// <param name="Upper">Upper limit likewise.</param>
/// <param name="AtLeast">b.</param>
/// <param name="Draws">B.</param>
/// <param name="Exhaustive">Whether the draws are all patterns there are.</param>
public sealed record ResampledTest(double Probability, double Lower, double Upper, int AtLeast, int Draws, bool Exhaustive) : TestResult
{
    public override double? P => Probability;
}
