using Auditor.Numerics.GroupTests;

namespace Auditor.Analysis;

/// <summary>The level on which a group's columns vary, as the record names it.</summary>
internal static class LevelWords
{
    public static string Of(VariationLevel level) => level switch
    {
        VariationLevel.Period => "period",
        VariationLevel.Cluster => "cluster",
        VariationLevel.Unit => "unit",
        VariationLevel.Mixture => "several",
        _ => "row",
    };
}
