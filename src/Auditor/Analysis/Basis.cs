using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>
/// The test on which a group's verdict rests, fixed by declaration, the level on which the group's columns vary, and policy, never by a test on the same
/// data. Beside it the F of the unrestricted covariance of the same kind: intervals, power and the negligible-effect test rest on that one.
/// </summary>
/// <param name="Name">The record's name of the test.</param>
/// <param name="Reason">Why this one, in words.</param>
/// <param name="Test">Decides whether leaving the group out is rejected.</param>
internal sealed record Basis(string Name, string Reason, TestResult Test)
{
    public const string Classical = "classical";
    public const string Hc3 = "hc3";
    public const string Cluster = "cluster";
    public const string Time = "time";

    /// <summary>The F without the null imposed, or why there is none; for classical and HC3 the test itself.</summary>
    public required TestResult Unrestricted { get; init; }

    /// <summary>Where two forms stand behind the verdict, the fewer of their denominator degrees of freedom; null: those of <see cref="Unrestricted"/> count.</summary>
    public double? LeastDf { get; init; }

    /// <summary>Null when <see cref="Unrestricted"/> has no value.</summary>
    public EffectiveRows? EffectiveRows { get; init; }

    /// <summary>Of a score form: the same form with the group's own fitted part in place of the residuals. Its p is where the test ends as the effect grows without limit.</summary>
    public TestResult? Ceiling { get; init; }

    /// <summary>The classes of rows that the form sums over; nothing for classical and HC3, two kinds where the larger p of two forms decides.</summary>
    public SummedOver Over { get; init; }

    /// <summary>Clusters or periods that the test sums over; null when it takes row by row.</summary>
    public int? Sums { get; init; }

    /// <summary>What <see cref="Needed"/> counts: rows, clusters or periods.</summary>
    public string CountedIn { get; init; } = Counted.Rows;

    /// <summary>How many of them make the test find an effect at a bound, at a level, with a power.</summary>
    public Func<double, double, double, double?>? Needed { get; init; }

    public FTest? Wald => Unrestricted as FTest;

    /// <summary>The score form cannot reject at the level, however large the effect.</summary>
    public bool CannotReject(double level) => Ceiling?.P > level;

    public static Basis Of(GroupResults results, BasisWithoutStructure policy, bool sampling)
    {
        if (results.Classical is PerfectWithGroup)
        {
            return OnClassical(results.Fit, results.Classical, "with the group in, the model fits perfectly; a robust form does not exist");
        }

        if (results.Fit.Sums.RestsOn.Count > 0 && !sampling)
        {
            return OnClassical(results.Fit, results.Classical, "the group rests on one row; a robust form does not exist");
        }

        return BasisUnderDependence.Of(results) ?? WithoutStructure(results, policy, sampling);
    }

    private static Basis WithoutStructure(GroupResults results, BasisWithoutStructure policy, bool sampling) =>
        policy == BasisWithoutStructure.Classical && !sampling
            ? OnClassical(results.Fit, results.Classical, "no cluster or time order is declared and the policy says classical")
            : OnHc3(results, sampling ? "sampling weights: only a robust test applies" : "no cluster or time order is declared: HC3 holds its level when variances differ");

    private static Basis OnClassical(GroupFit fit, TestResult test, string reason)
    {
        if (test is not FTest f)
        {
            return new Basis(Classical, reason, test) { Unrestricted = test };
        }

        var rows = EffectiveRows.Classical(f.Df1, f.Df2);
        return new Basis(Classical, reason, test)
        {
            Unrestricted = test,
            EffectiveRows = rows,
            Needed = (bound, level, power) => RowsNeeded(fit, f, rows, bound, level, power),
        };
    }

    private static Basis OnHc3(GroupResults results, string reason)
    {
        var (test, fit) = (results.Hc3, results.Fit);
        if (test is not FTest f || EffectiveRows.Of(fit.Sums.Hc3, fit.Added.RssWith / f.Df2, f.Df1, f.Df2) is not { } rows)
        {
            return new Basis(Hc3, reason, test) { Unrestricted = test };
        }

        return new Basis(Hc3, reason, test)
        {
            Unrestricted = test,
            EffectiveRows = rows,
            Needed = (bound, level, power) => RowsNeeded(fit, f, rows, bound, level, power),
        };
    }

    private static double? RowsNeeded(GroupFit fit, FTest f, EffectiveRows rows, double bound, double level, double power) =>
        Power.RowsNeeded(f.Df1, fit.Added.Final.Rank, rows.LeastInformed / (f.Df1 + f.Df2 + 1), bound, level, power);
}

/// <summary>Classes of rows that a form sums over.</summary>
[Flags]
internal enum SummedOver
{
    Nothing = 0,
    Cluster = 1,
    Unit = 2,
    Period = 4,
}

/// <summary>What observations are counted in, as the record writes it.</summary>
internal static class Counted
{
    public const string Rows = "rows";
    public const string Clusters = "clusters";
    public const string Periods = "periods";
}
