using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>Adjusts the p-values of the groups that have one; the others are not of the family.</summary>
internal static class Family
{
    /// <param name="logP">Natural logs of the p-values, null where there is none.</param>
    public static double?[] Adjust(IReadOnlyList<double?> logP, AdjustmentMethod method)
    {
        var members = Enumerable.Range(0, logP.Count).Where(i => logP[i] is not null).ToArray();
        var adjusted = Adjust([.. members.Select(i => logP[i]!.Value)], method);
        var all = new double?[logP.Count];
        for (var m = 0; m < members.Length; m++)
        {
            all[members[m]] = adjusted[m];
        }

        return all;
    }

    private static double[] Adjust(double[] logP, AdjustmentMethod method) => method switch
    {
        AdjustmentMethod.Holm => AdjustedP.Holm(logP),
        AdjustmentMethod.Hochberg => AdjustedP.Hochberg(logP),
        AdjustmentMethod.BenjaminiHochberg => AdjustedP.BenjaminiHochberg(logP),
        AdjustmentMethod.BenjaminiYekutieli => AdjustedP.BenjaminiYekutieli(logP),
        AdjustmentMethod.None => logP,
        _ => throw new ArgumentOutOfRangeException(nameof(method), method, "the policy reader refuses what is not built"),
    };
}
