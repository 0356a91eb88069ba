using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>
/// Score test over periods with the null imposed. Null: Z_g' M_F E(y) = 0. With s_t the sums of qz_i e_i(F) over the rows of a period (all units),
/// F = (nu - q + 1)/(nu q) phi u' (T O)^-1 u on (q, nu - q + 1), T O their long-run variance from nu cosines (<see cref="Cosines"/>), T observed periods.
/// phi as over clusters, with periods. Errors may depend on each other within a period and over time.
/// </summary>
/// <remarks>
/// Lazarus, Lewis, Stock and Watson 2018, Journal of Business and Economic Statistics 36 (from memory); phi is the project's own. Verified against
/// tests/vectors/score_forms.json (numpy).
/// </remarks>
public static class PeriodF
{
    /// <summary>Above this the products of cosines and periods are not formed.</summary>
    private const double MostWork = 5e9;

    public static TestResult Of(AddedGroup group, ClassSums periods) => Form(group, periods, periods.Score);

    /// <summary>
    /// The test's ceiling: the same form with e(F) replaced by the group's own fitted part. However large the effect, p cannot fall much below its p.
    /// </summary>
    public static TestResult Ceiling(AddedGroup group, ClassSums periods) => Form(group, periods, periods.FittedScore);

    /// <summary>nu, the number of cosines.</summary>
    public static int CosineCount(int periods) => Cosines.Number(periods);

    /// <summary>What keeps a form over periods from being computed.</summary>
    internal static Impediment? Why(AddedGroup group, ClassSums periods)
    {
        return Impediments.OfRobust(group) ?? Why(group.Rank, periods.Count, periods.Contributing);
    }

    /// <param name="q">Directions tested.</param>
    /// <param name="periods">Periods.</param>
    /// <param name="contributing">Periods with a non-zero row.</param>
    internal static Impediment? Why(int q, int periods, int contributing)
    {
        if (q > Cosines.Number(periods) || q >= contributing)
        {
            return Impediment.TooFewPeriods;
        }

        return (double)periods * Cosines.Number(periods) * q > MostWork ? Impediment.TooManyPeriods : null;
    }

    /// <summary>(nu - q + 1)/(nu q) W on (q, nu - q + 1).</summary>
    internal static TestResult Hotelling(double wald, int q, int nu) =>
        TestResult.F((nu - q + 1.0) / (nu * q) * wald, q, nu - q + 1);

    private static TestResult Form(AddedGroup group, ClassSums periods, Quadratic.Vector scores)
    {
        if (Why(group, periods) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        return Form(group.U, periods.Count, scores, ClusterF.Phi(group, periods), Impediments.ScoreScale(group));
    }

    /// <inheritdoc cref="ClusterF.Form(IReadOnlyList{double}, int, int, Quadratic.Vector, double, double)"/>
    internal static TestResult Form(IReadOnlyList<double> u, int periods, Quadratic.Vector scores, double phi, double scale)
    {
        var cosines = new Cosines(periods);
        return Quadratic.Form(u, cosines.Variance(u.Count, scores), scale) is double form
            ? Hotelling(phi * form, u.Count, cosines.Count)
            : TestResult.None(Impediment.SingularCovariance);
    }
}
