using Auditor.Numerics;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Test results as the record shows them.</summary>
internal static class TestFigure
{
    /// <summary>p-values below this are shown as 0 with their logarithm beside them.</summary>
    private const double LeastP = 1e-300;

    /// <summary>The figures, or null with the reason put under the test's record name.</summary>
    public static TestFigures? Of(TestResult? result, string name, IDictionary<string, string> notComputed)
    {
        switch (result)
        {
            case FTest test:
                return new TestFigures(test.Statistic, test.Df1, test.Df2, ShownP(test.Probability), Log10(test.LogP));
            case PerfectWithGroup perfect:
                return new TestFigures(null, perfect.Df1, perfect.Df2, 0, null, "the model with the group fits perfectly, without it it does not: F has no finite value");
            case NotComputable none:
                notComputed[name] = ImpedimentWords.Of(none.Why);
                return null;
            default:
                return null;
        }
    }

    public static double ShownP(double p) => p < LeastP ? 0 : p;

    /// <summary>log10 of p where p itself is shown as 0, else null.</summary>
    public static double? Log10(double logP) =>
        double.IsFinite(logP) && logP < Math.Log(LeastP) ? logP / Math.Log(10) : null;

    /// <summary>p with its logarithm; null when there is no p.</summary>
    public static PValue? P(TestResult result) => result switch
    {
        FTest test => new PValue(test.Probability, test.LogP),
        PerfectWithGroup => new PValue(0, double.NegativeInfinity),
        _ => null,
    };
}
