using Auditor.Numerics.SecondPass;

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
    /// <summary>Products in another order differ by rounding: rows this near, relatively, to what is kept are looked at exactly.</summary>
    private const double Near = 1e-9;
    private const int BlockRows = 1 << 14;

    /// <param name="count">How many rows to keep by Cook's distance.</param>
    public static InfluenceSummary Of(CheckedFit fit, int count)
    {
        if (!RowInfluence.HasResiduals(fit.Fit))
        {
            return new InfluenceSummary(false, [], [], null, 0);
        }

        var search = new Search(fit, count);
        var (residuals, leverages) = (new double[BlockRows], new double[BlockRows]);
        for (var first = 0; first < fit.Store.Count; first += BlockRows)
        {
            var rows = Math.Min(BlockRows, fit.Store.Count - first);
            fit.Store.Residuals.Read(first, residuals.AsSpan(0, rows));
            fit.Store.Leverages.Read(first, leverages.AsSpan(0, rows));
            search.Look(first, residuals.AsSpan(0, rows), leverages.AsSpan(0, rows));
        }

        return search.Found();
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

    /// <summary>Looks at a row exactly only when it may be among those that are kept.</summary>
    private sealed class Search(CheckedFit fit, int count)
    {
        private readonly List<int> _leverageOne = [];
        private readonly PriorityQueue<RowInfluence, (double, int)> _largest = new();
        private RowInfluence? _outermost;
        private double _observations;

        /// <summary>e² h / (1 - h)², in which Cook's distance rises, of the last row that is kept.</summary>
        private double _leastKept = double.NegativeInfinity;

        /// <summary>e² / (1 - h), in which the studentised residual rises, of the outermost row.</summary>
        private double _outermostSquare = double.NegativeInfinity;

        public void Look(int first, ReadOnlySpan<double> residuals, ReadOnlySpan<double> leverages)
        {
            for (var i = 0; i < residuals.Length; i++)
            {
                var h = Math.Min(1, leverages[i]);
                var free = 1 - h;
                if (free <= GroupAccumulator.LeverageOne)
                {
                    _leverageOne.Add(first + i);
                    continue;
                }

                _observations += fit.Store.CopiesOf(first + i);
                var square = residuals[i] * residuals[i] / free;
                var cook = square * h / free;
                if (cook >= _leastKept * (1 - Near) || square >= _outermostSquare * (1 - Near))
                {
                    Take(RowInfluence.Of(fit, first + i), square);
                }
            }
        }

        public InfluenceSummary Found()
        {
            var rising = Drain(_largest);
            rising.Reverse();
            return new InfluenceSummary(true, _leverageOne, rising, _outermost, _observations);
        }

        private void Take(RowInfluence row, double square)
        {
            _largest.Enqueue(row, (row.CooksDistance!.Value, -row.Position));
            if (_largest.Count > count)
            {
                _largest.Dequeue();
            }

            if (_largest.Count == count)
            {
                _leastKept = count == 0 ? double.PositiveInfinity : Scaled(_largest.Peek());
            }

            if (Size(row) > Size(_outermost))
            {
                (_outermost, _outermostSquare) = (row, square);
            }
        }

        private double Scaled(RowInfluence row)
        {
            var (e, h) = (fit.Store.Residuals[row.Position], row.Leverage);
            return e * e / (1 - h) * h / (1 - h);
        }
    }
}
