using Auditor.Numerics.Factor;
using Auditor.Numerics.GroupTests;

namespace Auditor.Numerics.ResidualChecks;

/// <summary>Checks that add columns to the final model and test them with the partial F.</summary>
internal static class PartialFCheck
{
    public static CheckOutcome Of(AddedGroup group) => PartialF.Of(group) switch
    {
        FTest f => new CheckStatistic(f.Statistic, f.Df1, f.Df2, f.Probability)
        {
            LogP = f.LogP,
            Sizes = [new(SizeMeasure.PartialRSquared, group.SumOfSquares / group.RssWithout)],
        },
        PerfectWithGroup perfect => new UnboundedCheck(perfect.Df1, perfect.Df2, null),
        _ => CheckOutcome.None(CheckImpediment.TooFew),
    };
}
