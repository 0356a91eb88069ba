namespace Auditor.Simulation;

/// <summary>One setting of the study.</summary>
/// <param name="Index">Part of the key of its random numbers.</param>
/// <param name="N">Rows.</param>
/// <param name="Q">Columns of the left-out group.</param>
internal sealed record Cell(int Index, ErrorLaw Law, int N, int Q)
{
    private static readonly int[] Rows = [100, 200, 500, 2000];
    private static readonly int[] Columns = [1, 3];

    /// <summary>True partial R² of the group: none, the policy's bound, and larger ones.</summary>
    public static IReadOnlyList<double> Effects { get; } = [0, 0.01, 0.02, 0.05, 0.1];

    public static IReadOnlyList<Cell> All { get; } =
    [
        .. (from law in ErrorLaw.All from q in Columns from n in Rows select (law, n, q))
            .Select((setting, index) => new Cell(index, setting.law, setting.n, setting.q)),
    ];
}
