using Auditor.Reporting;
using Auditor.Results;

namespace Auditor.Tests.Reporting;

/// <summary>The sample record with one text in every place that the author or the data fill.</summary>
internal static class HostileRecords
{
    private static readonly WhatIfOutcome Inconclusive = new(Verdicts.Inconclusive, Materialities.NotShown);
    private static readonly WhatIfOutcome NotSupported = new(Verdicts.NotSupported, Materialities.NotShown);

    /// <summary>300 characters: quotes, markup, an escaped end of a script, right-to-left letters and marks, an override of direction, and pictographs in text style.</summary>
    public static string Text { get; } = ("a\"b'c</script><img src=x onerror='a'>&amp;{{ page }}\u200f\u05e9\u05dc\u05d5\u05dd\u200f\u202etfel\u202c \u2600\ufe0e \ud83d\ude9c\ufe0e " + new string('w', 300))[..300];

    public static AuditRecord Of(string text) => SampleRecords.Full with
    {
        Model = SampleRecords.Full.Model with { Id = text, Title = text, Version = text, PreparedBy = text, Response = text, Terms = [text] },
        Exclusions = [.. SampleRecords.Full.Exclusions.Select(exclusion => Attacked(exclusion, text))],
        AllLeftOut = Attacked(SampleRecords.Full.AllLeftOut!, text),
        Findings = [.. SampleRecords.Full.Findings.Select(finding => finding with { Subject = text, Message = text, Advice = text, Rule = text })],
        Rows = SampleRecords.Full.Rows with
        {
            ColumnsNobodyMentions = [text],
            MissingByColumn = new Dictionary<string, int> { [text] = 1 },
            UndefinedByTerm = new Dictionary<string, int> { [text] = 1 },
        },
        FinalFit = Attacked(SampleRecords.Full.FinalFit, text),
        OtherFit = Attacked(SampleRecords.Full.OtherFit!, text),
        Claims = [.. SampleRecords.Full.Claims.Select(claim => claim with { What = text })],
        Policy = new Dictionary<string, object> { [text] = text },
        Provenance = SampleRecords.Full.Provenance with { DataSource = text, Declaration = text, Acceptances = text },
        WhatIf = new(
            0.05, 0.01, [0.01, 0.05], [0.01],
            [[[.. SampleRecords.Full.Exclusions.Select(_ => Inconclusive)]], [[.. SampleRecords.Full.Exclusions.Select(_ => NotSupported)]]]),
    };

    private static Exclusion Attacked(Exclusion exclusion, string text) => exclusion with
    {
        Group = text,
        Terms = [text],
        Reason = text,
        InShort = text,
        BasisReason = text,
        Because = text,
        TestsNotComputed = exclusion.TestsNotComputed.ToDictionary(pair => pair.Key, _ => text),
        Aliased = [new(text, text)],
    };

    private static FitSummary Attacked(FitSummary fit, string text) => fit with
    {
        Coefficients = [.. fit.Coefficients.Select(coefficient => coefficient with { Name = text })],
        Aliased = [new(text, text)],
        NearlyAliased = [new(text, 3)],
    };
}
