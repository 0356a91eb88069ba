using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>Points of the sample record's pictures. Invented.</summary>
internal static class SamplePlots
{
    private const int Rows = 60;

    public static PlotData Some { get; } = new(
        new(
            new(Points(i => 0.002 * i, i => 0.2 * Math.Sin(i)), Rows, false, [new(0.02, 0.01, 30), new(0.09, -0.01, 30)]),
            new([.. Enumerable.Range(0, Rows).Select(i => new NormalPoint((i - 29.5) / 14, (i - 29.5) / 13, ((i - 29.5) / 14) - 0.4, ((i - 29.5) / 14) + 0.4))], Rows, 2),
            new([.. Points(i => 0.002 * i, i => Math.Sqrt(Math.Abs(2 * Math.Sin(i)))), new(0.06, 1, 900)], Rows + 900, true, []),
            new(Points(i => 0.001 * (i % 9), i => 2 * Math.Sin(i)), Rows, false, []),
            [new(418, "L-20418", 0.0312, 4.61, 0.0681), new(1980, null, 0.0312, 4.6, 0.0431), new(77, "a label of many letters", 0.001, -4.6, 0.031)],
            0.00823, 7, false, 1),
        null);

    private static PlotPoint[] Points(Func<int, double> x, Func<int, double> y) => [.. Enumerable.Range(0, Rows).Select(i => new PlotPoint(x(i), y(i), 1))];
}
