using Auditor.Data;
using Auditor.Design;
using Auditor.Policies;
using Auditor.Results;

namespace Auditor.Analysis.Parts;

/// <summary>
/// The ways in which a declaration asks for rows to be divided: each segment column; the declared split, else the halves of the time span when time is declared. Where the
/// rows are cut depends on the rows of the fit that is shown, never on a group or on the response, so every group is divided alike.
/// </summary>
internal static class DivisionsOfRows
{
    private const string HalvesOfSpan = "halves of the time span";

    /// <param name="shown">Rows of the fit that is shown.</param>
    public static IReadOnlyList<Division> Of(BoundModel model, RowSubset shown, Policy policy)
    {
        var structure = model.Structure;
        var divisions = structure.Segments.Select(segment => OfSegment(segment, shown, policy.MostParts)).ToList();
        if (structure.Split is { } split)
        {
            divisions.Add(OfSplit(split));
        }
        else if (structure.Time is { } time)
        {
            divisions.Add(OfSpan(time, shown));
        }

        return divisions;
    }

    private static Division OfSegment(ClassedRows segment, RowSubset shown, int most)
    {
        int[] codes = [.. shown.Select(row => segment[row]).Where(code => code >= 0).Distinct().Order()];
        var why = codes.Length > most
            ? $"{segment.Name} has {PlainNumber.Count(codes.Length)} values in the rows that are used, more than the {PlainNumber.Count(most)} parts that the policy allows (most_parts)"
            : codes.Length == 0 ? "no row that is used has a value of it"
            : codes.Length < 2 ? "all rows that are used and have a value of it have the same one" : null;
        return new Division(
            segment.Name, Divisions.Segment, why is null ? [.. codes.Select(code => new DivisionPart(segment.Label(code), row => segment[row] == code))] : [], why);
    }

    private static Division OfSplit(BoundSplit split) => new(
        "split at " + split.Label,
        Divisions.Split,
        [
            new("up to " + split.Label, row => split.HasPlace(row) && split.IsFirst(row)),
            new("after " + split.Label, row => split.HasPlace(row) && !split.IsFirst(row)),
        ]);

    /// <summary>
    /// Cut after the period that leaves the numbers of rows in the two parts nearest to each other (the earlier one of two): whole periods only, so that rows of one period
    /// never stand on both sides.
    /// </summary>
    private static Division OfSpan(TimeAxis time, RowSubset shown)
    {
        var periods = time.Periods.Among(shown);
        if (periods.Count < 2)
        {
            return new Division(HalvesOfSpan, Divisions.Halves, [], "all rows that are used lie in one period");
        }

        var (sizes, before, last, best) = (periods.Sizes(), 0L, 0, long.MaxValue);
        for (var period = 0; period < periods.Count - 1; period++)
        {
            before += sizes[period];
            var apart = Math.Abs((2 * before) - shown.Count);
            (last, best) = apart < best ? (period, apart) : (last, best);
        }

        var (label, end) = (periods.Label(last), time.Periods[shown[periods.Codes.Index().First(row => row.Item == last).Index]]);
        return new Division(HalvesOfSpan, Divisions.Halves, [new("up to " + Named(label), row => time.Periods[row] <= end), new("after " + Named(label), row => time.Periods[row] > end)]);

        string Named(string period) => (time.Column is null ? "place " : time.Column.Name + " ") + period;
    }
}
