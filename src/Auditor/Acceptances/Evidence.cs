using Auditor.Facts;
using Auditor.Findings;
using Auditor.Rules;

namespace Auditor.Acceptances;

/// <summary>How strong a finding is in this audit, read from the facts it was made of.</summary>
/// <param name="PWhy">Why there is no p, when there is none.</param>
/// <param name="EffectWhy">Why there is no partial R², when there is none.</param>
internal sealed record Evidence(double? P, string PWhy, double? PartialRSquared, string EffectWhy)
{
    /// <summary>The first that the subject's facts list: an adjusted p before a p that stands alone.</summary>
    private static readonly string[] PNames = ["p_adjusted", "p_decisive", "p"];

    private const string EffectName = "partial_r_squared";

    public static string? PFact(About about) => PNames.FirstOrDefault(name => FactCatalogue.Find(about, name) is not null);

    public static string? EffectFact(About about) => FactCatalogue.Find(about, EffectName) is null ? null : EffectName;

    public static Evidence Of(Finding finding, Rule rule, IReadOnlyList<FactSet> facts)
    {
        var set = facts.FirstOrDefault(set => set.About == rule.About && set.Subject == finding.Subject);
        var (p, pWhy) = Number(set, PFact(rule.About));
        var (effect, effectWhy) = Number(set, EffectFact(rule.About));
        return new Evidence(p, pWhy, effect, effectWhy);
    }

    private static (double? Value, string Why) Number(FactSet? facts, string? name) => facts is null || name is null ? (null, "there is no such fact") : facts[name] switch
    {
        FactValue.Number number => (number.Value, ""),
        FactValue.NotComputable none => (null, none.Why),
        _ => (null, "it is no number"),
    };
}
