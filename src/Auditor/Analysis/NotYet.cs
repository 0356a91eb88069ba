using Auditor.Declaration;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Parts of the record that are not computed yet: listed with the reason, never left out, the author's digits kept.</summary>
internal static class NotYet
{
    private const string Why = "not built yet";

    public static IReadOnlyList<StepResult> Elimination(ModelDeclaration declaration) =>
        [.. (declaration.Elimination?.Steps ?? []).Select((step, index) => new StepResult(index + 1, step.Drop, null, null, null, null, null, Why))];
}
