using Auditor.Numerics.Distributions;
using Auditor.Results;

namespace Auditor.Analysis.Claims.Relations;

/// <summary>p of a test is the upper tail of F on its degrees of freedom; the second may be a rounded number, as some robust forms have it.</summary>
internal static class TestPFromF
{
    public static IEnumerable<ClaimRelation> Of(ClaimedTest test)
    {
        if (test is not { F: { } f, Df1: { } df1, Df2: { } df2, P: { } p } || df1.Printed.Lower <= 0 || df2.Printed.Lower <= 0)
        {
            yield break;
        }

        var statistic = Interval.Of(f.Printed, 0, double.PositiveInfinity);
        if (statistic.High < statistic.Low)
        {
            yield break;
        }

        double Tail(double at, double second) => double.IsInfinity(at) ? 0 : FisherF.Survival(at, df1.Printed.Value, second);
        double[] seconds = [df2.Printed.Lower, df2.Printed.Value, df2.Printed.Upper];
        var expected = new Interval(seconds.Min(second => Tail(statistic.High, second)), seconds.Max(second => Tail(statistic.Low, second)));
        yield return Relation.Of(p, Interval.Of(p.Printed, 0, 1), [f, df1, df2], expected, "p of a test follows from its F and degrees of freedom");
    }
}
