using Auditor.Numerics;
using Auditor.Numerics.GroupTests;
using Auditor.Policies;

namespace Auditor.Analysis;

/// <summary>Adjusts the p-values of the groups that have one; the others are not of the family.</summary>
internal static class Family
{
    /// <param name="p">Null where there is none.</param>
    public static PValue?[] Adjust(IReadOnlyList<PValue?> p, AdjustmentMethod method)
    {
        var members = Enumerable.Range(0, p.Count).Where(i => p[i] is not null).ToArray();
        var adjusted = Adjust([.. members.Select(i => p[i]!.Value)], method);
        var all = new PValue?[p.Count];
        for (var m = 0; m < members.Length; m++)
        {
            all[members[m]] = adjusted[m];
        }

        return all;
    }

    private static PValue[] Adjust(PValue[] p, AdjustmentMethod method) => method switch
    {
        AdjustmentMethod.Holm => AdjustedP.Holm(p),
        AdjustmentMethod.Hochberg => AdjustedP.Hochberg(p),
        AdjustmentMethod.BenjaminiHochberg => AdjustedP.BenjaminiHochberg(p),
        AdjustmentMethod.BenjaminiYekutieli => AdjustedP.BenjaminiYekutieli(p),
        AdjustmentMethod.None => p,
        _ => throw new ArgumentOutOfRangeException(nameof(method), method, "the policy reader refuses what is not built"),
    };
}
