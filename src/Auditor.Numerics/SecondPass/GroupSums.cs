namespace Auditor.Numerics.SecondPass;

/// <summary>
/// Sums over the rows for one group, all in the coordinates of its orthonormal Qz (q x q matrices): each is sum_i c_i omega_i qz_i qz_i'
/// with c_i the copies of the row. Rows with h(F) = 1 have qz = 0 and e = 0 by definition: they are left out and counted.
/// </summary>
public sealed class GroupSums
{
    internal GroupSums(int q)
    {
        (Hc0, Hc2, Hc3) = (new double[q, q], new double[q, q], new double[q, q]);
        (Score, Ceiling) = (new double[q, q], new double[q, q]);
    }

    /// <summary>omega = e², e the residual of F + group (White 1980).</summary>
    public double[,] Hc0 { get; }

    /// <summary>omega = e² / (1 - h), h the leverage in F + group.</summary>
    public double[,] Hc2 { get; }

    /// <summary>omega = e² / (1 - h)² (MacKinnon and White 1985).</summary>
    public double[,] Hc3 { get; }

    /// <summary>omega = e(F)²: the null-imposed score matrix M.</summary>
    public double[,] Score { get; }

    /// <summary>M with e(F) replaced by the group's own fitted part Qz u.</summary>
    public double[,] Ceiling { get; }

    /// <summary>sum h(F) |qz|², the trace of N in phi.</summary>
    public double LeverageTrace { get; internal set; }

    /// <summary>Observations with a non-zero qz row.</summary>
    public double ContributingN { get; internal set; }

    /// <summary>The same sums by declared cluster, null when none is declared.</summary>
    public ClassSums? Cluster { get; internal set; }

    public ClassSums? Unit { get; internal set; }

    public ClassSums? Period { get; internal set; }

    /// <summary>On which level the group's columns vary; null when no dependence is declared.</summary>
    public LevelCounts? Levels { get; internal set; }

    /// <summary>Positions (0-based, within the row set) of rows with leverage 1 in F.</summary>
    public IReadOnlyList<int> LeverageOneInFinal => LeverageOneRows;

    /// <summary>Positions of rows whose leverage becomes 1 when the group is added: HC2, HC3 and the score form do not exist then.</summary>
    public IReadOnlyList<int> RestsOn => RestsOnRows;

    /// <summary>Takes in the sums over the rows that follow.</summary>
    internal void Merge(GroupSums next)
    {
        SquareSums.Add(Hc0, next.Hc0);
        SquareSums.Add(Hc2, next.Hc2);
        SquareSums.Add(Hc3, next.Hc3);
        SquareSums.Add(Score, next.Score);
        SquareSums.Add(Ceiling, next.Ceiling);
        LeverageTrace += next.LeverageTrace;
        ContributingN += next.ContributingN;
        LeverageOneRows.AddRange(next.LeverageOneRows);
        RestsOnRows.AddRange(next.RestsOnRows);
    }

    internal List<int> LeverageOneRows { get; } = [];

    internal List<int> RestsOnRows { get; } = [];
}
