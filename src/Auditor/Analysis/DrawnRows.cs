using Auditor.Numerics.ResidualChecks;

namespace Auditor.Analysis;

/// <summary>The rows of a fit that pictures are made of: all, or of very many one in some and those that bear most on the fit.</summary>
/// <param name="Positions">Rising.</param>
/// <param name="OneIn">Of so many neighbouring rows one is drawn; 1: all.</param>
internal sealed record DrawnRows(IReadOnlyList<int> Positions, int OneIn)
{
    /// <summary>A picture made of more rows looks the same.</summary>
    private const int Most = 500_000;

    public static DrawnRows Of(int rows, InfluenceSummary influence)
    {
        var step = ((rows - 1) / Most) + 1;
        var every = Enumerable.Range(0, ((rows - 1) / step) + 1).Select(at => at * step);
        return step == 1
            ? new DrawnRows([.. every], 1)
            : new DrawnRows([.. every.Concat(influence.Largest.Select(row => row.Position)).Distinct().Order()], step);
    }
}
