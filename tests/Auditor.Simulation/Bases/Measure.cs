namespace Auditor.Simulation.Bases;

/// <summary>Something that happens or not in a data set: a column of a table.</summary>
/// <param name="Effect">True partial R² of the group in these data sets.</param>
/// <param name="Happens">Null when the test has no value.</param>
/// <param name="Goal">Most that its share may be; null where it has none.</param>
/// <param name="Summed">Named in the summary of levels.</param>
internal sealed record Measure(string Heading, double Effect, Func<DataLook, bool?> Happens, double? Goal = null, bool Summed = false);

/// <summary>How often it happened. Whole numbers, so that the order of adding does not matter.</summary>
internal sealed class Counted
{
    public int Happened { get; private set; }

    public int Values { get; private set; }

    public int Draws { get; private set; }

    /// <summary>Of the data sets in which the test has a value; null when that is less than half of them.</summary>
    public Share? Share => 2 * Values < Draws || Values == 0 ? null : new Share(Happened / (double)Values, Values);

    public void Add(bool? happens)
    {
        Draws++;
        Values += happens is null ? 0 : 1;
        Happened += happens == true ? 1 : 0;
    }

    public void Add(Counted other)
    {
        Draws += other.Draws;
        Values += other.Values;
        Happened += other.Happened;
    }
}
