using System.Text.Json;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The verdicts at other levels and bounds, as the page's script reads them.</summary>
internal static class WhatIfValues
{
    private static readonly JsonSerializerOptions Options = new() { PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower };

    private static readonly WhatIfOutcome[] Kinds =
    [
        new(Verdicts.NotSupported, Materialities.NotShown),
        new(Verdicts.NotSupported, Materialities.ShownNegligible),
        new(Verdicts.Supported, Materialities.NotShown),
        new(Verdicts.Inconclusive, Materialities.NotShown),
        new(Verdicts.Untestable, Materialities.NotShown),
    ];

    /// <summary>JSON whose angle brackets and ampersands are escaped, so that no name can end the element it stands in. Null when there is nothing to try.</summary>
    public static Markup? Of(AuditRecord record) => record.WhatIf is { } what
        ? new Markup(JsonSerializer.Serialize(
            new Values(
                what.Level, what.Bound, what.Levels, what.Bounds,
                [.. record.Exclusions.Select(exclusion => exclusion.Group)],
                [.. Kinds.Select(kind => VerdictWords.Of(kind.Verdict, kind.Materiality).Word)],
                [.. what.Outcomes.Select(level => level.Select(bound => bound.Select(Kind).ToArray()).ToArray())]),
            Options))
        : null;

    private static int Kind(WhatIfOutcome outcome) => Array.FindIndex(
        Kinds, kind => VerdictWords.Of(kind.Verdict, kind.Materiality) == VerdictWords.Of(outcome.Verdict, outcome.Materiality));

    private sealed record Values(
        double Level, double Bound, IReadOnlyList<double> Levels, IReadOnlyList<double> Bounds, string[] Groups, string[] Words, int[][][] Verdicts);
}
