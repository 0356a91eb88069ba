using Auditor.Numerics.ResidualChecks;

namespace Auditor.Analysis;

/// <summary>The rows of a fit that pictures are made of: all, or of very many one in some and those that bear most on the fit.</summary>
/// <param name="Positions">Rising.</param>
/// <param name="OneIn">Of so many neighbouring rows one is drawn; 1: all.</param>
/// <param name="LeverageOne">Rows of the fit with leverage 1, drawn or not.</param>
internal sealed record DrawnRows(IReadOnlyList<int> Positions, int OneIn, int LeverageOne)
{
    /// <summary>A picture made of more rows looks the same.</summary>
    private const int Most = 500_000;

    /// <summary>An odd number whose products spread (Knuth 1973, multiplicative hashing; from memory).</summary>
    private const uint Spread = 2_654_435_761;

    public static DrawnRows Of(int rows, InfluenceSummary influence)
    {
        var step = ((rows - 1) / Most) + 1;
        IEnumerable<int> some = Enumerable.Range(0, ((rows - 1) / step) + 1).Select(run => Of(run, step)).Where(position => position < rows);
        return new DrawnRows(
            [.. step == 1 ? some : some.Concat(influence.Largest.Select(row => row.Position)).Distinct().Order()], step, influence.LeverageOne.Count);
    }

    /// <summary>Whether the row was drawn as one of its neighbours, not for its influence.</summary>
    public bool IsAtRandom(int position) => Of(position / OneIn, OneIn) == position;

    /// <summary>The row drawn of a run of neighbours: now one, now another, so that no order of the file decides.</summary>
    private static int Of(int run, int step) => (run * step) + (int)(((unchecked((uint)run * Spread) >> 16) * (ulong)step) >> 16);
}
