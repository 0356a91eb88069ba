namespace Auditor.Numerics.ResidualChecks;

/// <summary>
/// The order of the rows of one row set in time. A row's lag k is the row of the same unit k periods earlier; where that period is not among
/// the rows there is none, so nothing reaches over a gap or from one unit into another.
/// </summary>
public sealed class SerialOrder
{
    private readonly int[] _units;
    private readonly long[] _periods;

    private SerialOrder(int[] positions, int[] units, long[] periods)
    {
        Positions = positions;
        (_units, _periods) = ([.. positions.Select(position => units[position])], [.. positions.Select(position => periods[position])]);
        Units = _units.Distinct().Count();
        Gaps = Enumerable.Range(1, Math.Max(0, Rows - 1)).Count(at => _units[at] == _units[at - 1] && _periods[at] > _periods[at - 1] + 1);
    }

    /// <summary>0-based positions of the rows within the row set, unit by unit, in time order within each.</summary>
    public IReadOnlyList<int> Positions { get; }

    public int Rows => Positions.Count;

    /// <summary>How many series there are.</summary>
    public int Units { get; }

    /// <summary>Places within a unit where at least one period is missing.</summary>
    public int Gaps { get; }

    /// <summary>One series without gaps.</summary>
    /// <param name="positions">Positions of the rows, first in time first.</param>
    public static SerialOrder Of(IReadOnlyList<int> positions)
    {
        var periods = new long[positions.Count];
        for (var at = 0; at < periods.Length; at++)
        {
            periods[positions[at]] = at;
        }

        return new SerialOrder([.. positions], new int[periods.Length], periods);
    }

    /// <param name="units">The unit of each row; all the same for one series.</param>
    /// <param name="periods">The period of each row, whole numbers that rise by one from a period to the next.</param>
    /// <returns>Null when two rows share unit and period: they have no order.</returns>
    public static SerialOrder? Of(IReadOnlyList<int> units, IReadOnlyList<long> periods)
    {
        int[] positions = [.. Enumerable.Range(0, units.Count).OrderBy(row => units[row]).ThenBy(row => periods[row])];
        bool Tied(int at) => (units[positions[at]], periods[positions[at]]) == (units[positions[at - 1]], periods[positions[at - 1]]);
        return Enumerable.Range(1, Math.Max(0, positions.Length - 1)).Any(Tied) ? null : new SerialOrder(positions, [.. units], [.. periods]);
    }

    /// <summary>For each place in time order, the place of the row's lag; -1 where there is none.</summary>
    public int[] Lag(int periods)
    {
        var lags = new int[Rows];
        var earlier = 0;
        for (var at = 0; at < lags.Length; at++)
        {
            while (_units[earlier] != _units[at] || _periods[earlier] < _periods[at] - periods)
            {
                earlier++;
            }

            lags[at] = _periods[earlier] == _periods[at] - periods ? earlier : -1;
        }

        return lags;
    }

    /// <summary>Values of the rows by position, brought into time order.</summary>
    internal double[] Arrange(IReadOnlyList<double> values) => [.. Positions.Select(position => values[position])];
}
