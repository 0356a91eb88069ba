using System.Globalization;
using Auditor.Numerics;
using Auditor.Policies;

namespace Auditor.Simulation.Bases;

/// <summary>The settings of the study, and what is measured in them under a policy.</summary>
internal sealed class Worlds(Policy policy)
{
    /// <summary>True partial R² at which power is measured.</summary>
    public const double Effect = 0.1;

    private const double LevelFactor = 1.6;
    private const double SupportGoal = 0.08;

    private static readonly int[] Widths = [1, 3, 6];
    private static readonly int[] FamilySizes = [1, 5, 10, 30];

    private double Level => policy.Significance;

    private double Bound => policy.NegligiblePartialRSquared;

    public IReadOnlyList<World> All => [Rows, Clusters, SeriesInTime, Panels, Families];

    private World Rows => new(
        "independent rows",
        "Nothing is declared; the verdict rests on HC3. z, on which variances depend, is the group's first column.",
        ["errors", "q", "n"],
        [.. from law in RowSetting.Laws from q in Widths from n in new[] { 20, 60, 200, 2000 } select new RowSetting(law, n, [q], law.Name, Whole(q), Whole(n))],
        [
            Basis("HC3", look => look.Hc3), Test("classical F", look => look.Classical), Test("score form", look => look.Score),
            Shortcut("any t", look => look.Group.AnyT),
            Shortcut("variance check chooses", look => Rejects(look.VarianceCheckRejects(Level) ? look.Group.Hc3 : look.Group.Classical)),
            Supported, SupportedOnClassical, Power("HC3", look => look.Hc3), Power("classical F", look => look.Classical),
        ]);

    private World Clusters => new(
        "clusters",
        "Cluster is declared; the verdict rests on the cluster score form, what a non-rejection is worth on CR2.",
        ["errors", "columns", "q", "clusters"],
        [
            .. from law in ClusterLaw.All
               from kind in Enum.GetValues<ClusterColumns>()
               from q in kind == ClusterColumns.ThreeClusters ? [1] : Widths
               from c in new[] { 12, 20, 40, 60 }
               select new ClusterSetting(law, kind, c, [q], law.Name, Words(kind), Whole(q), Whole(c)),
        ],
        [
            Basis("cluster form", look => look.Basis), Test("CR2", look => look.Cr2), Test("CR1", look => look.Cr1), Test("HC3", look => look.Hc3),
            Test("classical F", look => look.Classical), Shortcut("any t", look => look.Group.AnyT),
            Supported, SupportedWhateverTheCeiling, Power("cluster form", look => look.Basis), CannotReject,
        ]);

    private World SeriesInTime => new(
        "one series in time",
        "Time is declared, one row a period; the verdict rests on the cosine form. Cleared: it rejects and the unit-root check of the final model's residual rejects too (otherwise the group is inconclusive).",
        ["rho", "q", "periods"],
        [
            .. from rho in new[] { 0.3, 0.8, 1 }
               from q in rho == 1 ? [1, 3] : Widths
               from t in new[] { 20, 60, 200, 600 }
               select new SeriesSetting(rho, t, [q], rho == 1 ? "1 (random walks)" : rho.ToString(CultureInfo.InvariantCulture), Whole(q), Whole(t)),
        ],
        [
            Basis("cosine form", look => look.Basis),
            new Measure("cosine form, cleared", 0, Cleared, LevelFactor * Level, Summed: true),
            Test("Newey–West", look => look.NeweyWest), Test("HC3", look => look.Hc3), Test("classical F", look => look.Classical),
            Shortcut("any t", look => look.Group.AnyT), Supported, SupportedWhateverTheCeiling, Power("cosine form", look => look.Basis),
            new Measure("power, cosine form, cleared", Effect, Cleared), CannotReject,
        ]);

    private World Panels => new(
        "loan panel",
        "Loan is declared as cluster and unit, period as time; the verdict rests on the form of the level on which the group varies: period sums, loan, the larger p of both for a mixture, else the declared cluster (loan).",
        ["columns", "q", "loans", "periods"],
        [
            .. from kind in Enum.GetValues<PanelColumns>()
               from q in kind == PanelColumns.Mixture ? [3] : kind is PanelColumns.Macro or PanelColumns.Follows ? [1, 3, 6] : new[] { 1 }
               from size in new[] { (Loans: 20, Periods: 20), (Loans: 20, Periods: 40), (Loans: 50, Periods: 40), (Loans: 20, Periods: 80) }
               select new PanelSetting(kind, size.Loans, size.Periods, [q], Words(kind), Whole(q), Whole(size.Loans), Whole(size.Periods)),
        ],
        [
            Basis("by level of variation", look => look.Basis), Test("cosine form on period sums", look => look.Period), Test("cluster form by loan", look => look.Cluster),
            Test("CR1 by loan", look => look.Cr1), Test("CR1 by period", look => look.Cr1ByPeriod), Test("Newey–West on period sums", look => look.NeweyWest),
            Test("larger p of cosine and loan form", look => look.LargerOfBoth), Test("HC3", look => look.Hc3), Shortcut("any t", look => look.Group.AnyT),
            Supported, SupportedWhateverTheCeiling, Power("by level of variation", look => look.Basis), Power("larger p of both", look => look.LargerOfBoth), CannotReject,
        ]);

    private World Families => new(
        "families of groups",
        "30 groups without effect, of 1 and 2 columns by turns, each added to the final model alone; the share of data sets in which any of the first 1, 5, 10 or 30 is rejected. Basis as above.",
        ["errors", "n"],
        [.. FamilySettings()],
        [
            .. FamilySizes.Select(size => new Measure("basis, Holm, " + Whole(size), 0, look => look.AnyAfterHolm(size, one => one.Basis, Level), size == 1 ? LevelFactor * Level : Level)),
            new("classical F, Holm, 30", 0, look => look.AnyAfterHolm(30, one => one.Classical, Level)),
            new("score form, Holm, 30", 0, look => look.AnyAfterHolm(30, one => one.Score, Level)),
            new("HC3, Holm, 30", 0, look => look.AnyAfterHolm(30, one => one.Hc3, Level)),
            new("basis, unadjusted, 30", 0, look => look.Groups.Any(one => Rejects(one.Basis) == true)),
            new("any t, 30", 0, look => look.Groups.Any(one => one.AnyT)),
        ]);

    private Measure Supported => new("wrongly supported", Bound, look => look.Group.Supported(Level, Bound), SupportGoal);

    private Measure SupportedWhateverTheCeiling => new("the same, ceiling ignored", Bound, look => look.Group.SupportedWhateverTheCeiling(Level, Bound));

    private Measure CannotReject => new("cannot reject", Effect, look => look.Group.CannotReject(Level));

    private Measure SupportedOnClassical => new("wrongly supported, classical", Bound, look => look.Group.SupportedOnClassical(Level, Bound));

    private static IEnumerable<Setting> FamilySettings()
    {
        int[] widths = [.. Enumerable.Range(0, 30).Select(g => 1 + (g % 2))];
        foreach (var n in new[] { 60, 200 })
        {
            foreach (var law in RowSetting.Laws)
            {
                yield return new RowSetting(law, n, widths, law.Name, Whole(n));
            }
        }

        foreach (var c in new[] { 12, 40 })
        {
            yield return new ClusterSetting(ClusterLaw.All[0], ClusterColumns.Constant, c, widths, "clusters, constant columns", Whole(c) + " clusters");
            yield return new ClusterSetting(ClusterLaw.All[1], ClusterColumns.Varying, c, widths, "clusters, varying columns, variance exp(z)", Whole(c) + " clusters");
        }

        yield return new SeriesSetting(0.3, 200, widths, "series, rho 0.3", "200 periods");
        yield return new SeriesSetting(0.8, 200, widths, "series, rho 0.8", "200 periods");
        yield return new PanelSetting(PanelColumns.Macro, 20, 40, widths, "loan panel, macro columns", "20 loans, 40 periods");
    }

    private static string Whole(int number) => number.ToString(CultureInfo.InvariantCulture);

    private static string Words(ClusterColumns kind) => kind switch
    {
        ClusterColumns.Constant => "constant within cluster",
        ClusterColumns.Varying => "varying",
        _ => "1 in three clusters",
    };

    private static string Words(PanelColumns kind) => kind switch
    {
        PanelColumns.MacroWalk => "macro, random walk",
        PanelColumns.Macro => "macro, rho 0.8",
        PanelColumns.Loan => "constant within loan",
        PanelColumns.Own => "varying, own to the loan",
        PanelColumns.Follows => "varying, follows a macro series",
        _ => "mixture: one macro, two varying",
    };

    private Measure Basis(string heading, Func<Look, TestResult> test) => Test(heading, test) with { Goal = LevelFactor * Level };

    private Measure Test(string heading, Func<Look, TestResult> test) => new(heading, 0, look => Rejects(test(look.Group)), Summed: true);

    private static Measure Shortcut(string heading, Func<DataLook, bool?> happens) => new(heading, 0, happens, Summed: true);

    private Measure Power(string heading, Func<Look, TestResult> test) => new("power, " + heading, Effect, look => Rejects(test(look.Group)));

    private bool? Cleared(DataLook look) => Rejects(look.Group.Basis) is bool rejects ? rejects && look.HasNoUnitRoot(2, Level) : null;

    private bool? Rejects(TestResult test) => test.P is double p ? p <= Level : null;
}
