using Auditor.Data;

namespace Auditor.Design;

/// <summary>The rows of a fit in time order, unit by unit.</summary>
/// <param name="Positions">Positions of the fit's rows by unit, then time, then place in the file.</param>
/// <param name="Series">Units, 1 when none is declared. Checks of one series have a meaning only when it is 1.</param>
/// <param name="TiedRows">Rows that share unit and period with the row before them in this order: with any of them neighbours are not one period apart.</param>
/// <param name="MissingPeriods">Periods without a row between the first and the last of each unit, added up; null when periods cannot be counted (dates without a declared period).</param>
public sealed record SerialOrder(int[] Positions, int Series, int TiedRows, long? MissingPeriods)
{
    internal static SerialOrder Of(TimeAxis time, RowGroups? units, RowGroups periods, RowSubset rows)
    {
        int Unit(int position) => units?.Codes[position] ?? 0;
        int[] tableRows = [.. rows];
        var places = Enumerable.Range(0, rows.Count).Select(position => (Unit: Unit(position), Time: time.Moments[tableRows[position]], Position: position)).ToArray();
        Array.Sort(places);
        int[] positions = [.. places.Select(place => place.Position)];
        var neighbours = positions.Zip(positions.Skip(1)).Where(pair => Unit(pair.First) == Unit(pair.Second)).ToList();
        return new SerialOrder(
            positions,
            units?.Count ?? 1,
            neighbours.Count(pair => periods.Codes[pair.First] == periods.Codes[pair.Second]),
            time.Steps is { } steps ? neighbours.Sum(pair => Math.Max(0, steps[tableRows[pair.Second]] - steps[tableRows[pair.First]] - 1)) : null);
    }
}
