using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.Elimination;

/// <summary>
/// p of a left-out group given that a backward elimination on the same rows left it out. Null: E(y) in col(F), so that every other dropped group is without effect
/// too; errors normal, independent, of equal variance. Given P_F y, RSS(F), u_z and u_r (<see cref="ResponseCircle"/>) only theta is random, with
/// tan² theta df2/df1 on F(df1, df2), df1 = rank the group adds, df2 = n - rank(F + group). E holds the theta at which the rule, replayed from all
/// candidates, ends in the reported model, by any path; p = P(theta >= theta observed, E)/P(E), uniform under the null.
/// </summary>
/// <remarks>
/// After Loftus and Taylor 2015 and Rügamer and Greven 2018 (from memory). E is found on a grid of quantiles of the law of theta and its ends by bisection: a hole between two
/// neighbours of the grid that agree is not seen. Verified against tests/vectors/selective_p.json (another implementation in numpy) and by draws of whole responses.
/// </remarks>
public static class SelectiveP
{
    /// <param name="path">The rule's path on the same rows; it must end in the reported model.</param>
    public static TestResult Of(AddedGroup group, Candidates candidates, DroppingRule rule, EliminationPath path)
    {
        if (path.Impediment is Impediment none)
        {
            return TestResult.None(none);
        }

        return !path.EndsInReported ? TestResult.None(Impediment.RuleEndsElsewhere) : PartialF.Of(group) switch
        {
            FTest test => Given(ResponseCircle.Of(group), new SelectionEvent(group.Final.Factor, candidates, rule), new ThetaLaw(test.Df1, test.Df2)),
            PerfectWithGroup => TestResult.None(Impediment.PerfectWithGroup),
            var without => without,
        };
    }

    private static TestResult Given(ResponseCircle circle, SelectionEvent selection, ThetaLaw law)
    {
        var found = selection.On(circle, law.Grid(circle.Tangent));
        if (found.Count == 0)
        {
            return TestResult.None(Impediment.SelectionHangsOnRounding);
        }

        var whole = LogSum(found.Select(interval => law.LogBetween(interval.From, interval.To)));
        var beyond = LogSum(found.Where(interval => interval.To > circle.Tangent)
            .Select(interval => law.LogBetween(Math.Max(interval.From, circle.Tangent), interval.To)));
        var log = Math.Min(0, beyond - whole);
        return double.IsNaN(log) || double.IsInfinity(whole)
            ? TestResult.None(Impediment.SelectionHangsOnRounding)
            : new SelectiveTest(Math.Exp(log), log, Math.Exp(Math.Min(0, whole)), Math.Atan(circle.Tangent), found);
    }

    private static double LogSum(IEnumerable<double> logs)
    {
        double[] all = [.. logs];
        var largest = all.DefaultIfEmpty(double.NegativeInfinity).Max();
        return double.IsInfinity(largest) ? largest : largest + Math.Log(all.Sum(log => Math.Exp(log - largest)));
    }
}

/// <summary>A selective p.</summary>
/// <param name="Selection">P(E): how often, under the null and given the rest, the rule would have left the same groups out.</param>
/// <param name="Theta">Observed, in radians.</param>
/// <param name="Event">The intervals of E, ascending.</param>
public sealed record SelectiveTest(double Probability, double LogP, double Selection, double Theta, IReadOnlyList<TangentInterval> Event) : TestResult
{
    public override double? P => Probability;
}

/// <summary>An interval of tan theta, 0 to infinity at most.</summary>
public readonly record struct TangentInterval(double From, double To);
