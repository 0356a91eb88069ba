namespace Auditor.Simulation;

/// <summary>What happened in the draws of one cell at one effect. Whole numbers, so that the order of adding does not matter.</summary>
internal sealed class Tally
{
    private readonly int[] _counts = new int[Enum.GetValues<Event>().Length];

    public int Draws { get; private set; }

    public void Add(IEnumerable<Event> events)
    {
        Draws++;
        foreach (var one in events)
        {
            _counts[(int)one]++;
        }
    }

    public void Add(Tally other)
    {
        Draws += other.Draws;
        for (var i = 0; i < _counts.Length; i++)
        {
            _counts[i] += other._counts[i];
        }
    }

    public Share Of(Event one) => new(_counts[(int)one] / (double)Draws, Draws);
}

/// <summary>A share of the draws with its Monte Carlo standard error.</summary>
internal readonly record struct Share(double Value, int Draws)
{
    public double Error => Math.Sqrt(Value * (1 - Value) / Draws);
}

internal enum Event
{
    PartialFRejects,
    Hc0Rejects,
    Hc1Rejects,
    Hc2Rejects,
    Hc3Rejects,
    ScoreRejects,
    SupportedOnHc3,
    SupportedOnClassical,
    Hc3IntervalCovers,
    ClassicalIntervalCovers,
}
