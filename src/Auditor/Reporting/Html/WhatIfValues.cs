using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using System.Text.Json.Serialization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The verdicts at other levels and bounds, as the page's script reads them.</summary>
internal static class WhatIfValues
{
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
            new WhatIfTable(
                what.Level, what.Bound, what.Levels, what.Bounds,
                [.. record.Exclusions.Select(exclusion => exclusion.Group)],
                [.. Kinds.Select(kind => VerdictWords.Of(kind.Verdict, kind.Materiality).Word)],
                [.. what.Outcomes.Select(level => level.Select(bound => bound.Select(Kind).ToArray()).ToArray())]),
            WhatIfShape.Default.WhatIfTable))
        : null;

    private static int Kind(WhatIfOutcome outcome) => Array.FindIndex(
        Kinds, kind => VerdictWords.Of(kind.Verdict, kind.Materiality) == VerdictWords.Of(outcome.Verdict, outcome.Materiality));
}

internal sealed record WhatIfTable(
    double Level, double Bound, IReadOnlyList<double> Levels, IReadOnlyList<double> Bounds, string[] Groups, string[] Words, int[][][] Verdicts);

[JsonSourceGenerationOptions(PropertyNamingPolicy = JsonKnownNamingPolicy.SnakeCaseLower)]
[JsonSerializable(typeof(WhatIfTable))]
[SuppressMessage("ApiDesign", "RS0030", Justification = "The banned calls are those of the framework's generator.")]
internal sealed partial class WhatIfShape : JsonSerializerContext;
