using Auditor.Numerics.Factor;
using Auditor.Numerics.SecondPass;

namespace Auditor.Numerics.GroupTests;

/// <summary>How a squared residual enters the covariance; k = rank(F + group), h its leverage.</summary>
public enum Heteroskedastic
{
    /// <summary>e² (White 1980).</summary>
    Hc0,

    /// <summary>n / (n - k) e².</summary>
    Hc1,

    /// <summary>e² / (1 - h).</summary>
    Hc2,

    /// <summary>e² / (1 - h)².</summary>
    Hc3,
}

/// <summary>
/// Heteroskedasticity-robust Wald test. Null: all coefficients of the group's columns in F + group are zero. F = u' V^-1 u / q on
/// (q, n - rank(F+g)) with V = sum omega_i qz_i qz_i'. Errors independent, variances free. Over-rejects in small samples, HC3 least.
/// </summary>
/// <remarks>
/// MacKinnon and White 1985, Journal of Econometrics 29; Long and Ervin 2000, The American Statistician 54. Verified against R's sandwich and
/// 100-digit arithmetic (tests/reference) and tests/vectors/added_block.json.
/// </remarks>
public static class WaldF
{
    public static TestResult Of(AddedGroup group, GroupSums sums, Heteroskedastic estimator)
    {
        if (Impediments.OfRobust(group) is Impediment impediment)
        {
            return TestResult.None(impediment);
        }

        if (estimator >= Heteroskedastic.Hc2 && sums.RestsOn.Count > 0)
        {
            return TestResult.None(Impediment.RestsOnOneRow);
        }

        return Quadratic.Form(group.U, Covariance(group, sums, estimator)) is double form
            ? TestResult.F(form / group.Rank, group.Rank, PartialF.ResidualDf(group))
            : TestResult.None(Impediment.SingularCovariance);
    }

    /// <summary>V of u, q x q.</summary>
    public static double[,] Covariance(AddedGroup group, GroupSums sums, Heteroskedastic estimator) => estimator switch
    {
        Heteroskedastic.Hc0 => sums.Hc0,
        Heteroskedastic.Hc1 => Quadratic.Scaled(sums.Hc0, group.Final.Factor.Totals.N / PartialF.ResidualDf(group)),
        Heteroskedastic.Hc2 => sums.Hc2,
        _ => sums.Hc3,
    };
}
