namespace Auditor.Numerics.ResidualChecks;

/// <summary>The rows that bear most on a fit, found in one look at all rows; no list of all rows is made.</summary>
/// <param name="HasResiduals">Whether there is a fit to bear on: false when it is perfect or has no degrees of freedom.</param>
/// <param name="LeverageOne">Positions of rows with leverage 1.</param>
/// <param name="Largest">Largest Cook's distance first; of equal ones the earlier row.</param>
/// <param name="Outermost">Largest absolute studentised residual, a row that alone spoils the fit before all; null when no row has one.</param>
/// <param name="Observations">Observations with leverage below 1.</param>
public sealed record InfluenceSummary(
    bool HasResiduals, IReadOnlyList<int> LeverageOne, IReadOnlyList<RowInfluence> Largest, RowInfluence? Outermost, double Observations)
{
    /// <param name="count">How many rows to keep by Cook's distance.</param>
    public static InfluenceSummary Of(CheckedFit fit, int count)
    {
        var (leverageOne, largest, outermost, observations) = (new List<int>(), new PriorityQueue<RowInfluence, (double, int)>(), (RowInfluence?)null, 0.0);
        foreach (var row in RowInfluence.OfAll(fit))
        {
            if (row.HasLeverageOne)
            {
                leverageOne.Add(row.Position);
                continue;
            }

            observations += fit.Store.Copies[row.Position];
            largest.Enqueue(row, (row.CooksDistance!.Value, -row.Position));
            if (largest.Count > count)
            {
                largest.Dequeue();
            }

            outermost = Size(row) > Size(outermost) ? row : outermost;
        }

        var rising = Drain(largest);
        rising.Reverse();
        return new InfluenceSummary(RowInfluence.HasResiduals(fit.Fit), leverageOne, rising, outermost, observations);
    }

    private static double Size(RowInfluence? row) => row switch
    {
        { AloneSpoilsTheFit: true } => double.PositiveInfinity,
        { StudentisedResidual: double t } => Math.Abs(t),
        _ => -1,
    };

    private static List<RowInfluence> Drain(PriorityQueue<RowInfluence, (double, int)> queue)
    {
        var rows = new List<RowInfluence>(queue.Count);
        while (queue.TryDequeue(out var row, out _))
        {
            rows.Add(row);
        }

        return rows;
    }
}
