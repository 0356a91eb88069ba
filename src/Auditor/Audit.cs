using Auditor.Analysis;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using Auditor.Facts;
using Auditor.Findings;
using Auditor.Policies;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.Rules;

namespace Auditor;

/// <summary>
/// The audit, values in and values out: declaration and data, bound terms and row sets, fits and tests, facts, rules, findings, record. No step reads
/// or writes a file.
/// </summary>
public static class Audit
{
    /// <summary>The record, or the problems that keep the declaration from being audited on these data.</summary>
    public static Reading<AuditRecord> Run(AuditInputs inputs)
    {
        var declaration = inputs.Declaration;
        var bound = ModelBinder.Bind(declaration, inputs.Table);
        if (bound.Value is null)
        {
            return Reading<AuditRecord>.Failed(bound.Problems);
        }

        var mentioned = inputs.Mentions.Select(mention => mention.Column).ToHashSet(StringComparer.Ordinal);
        var analysis = ModelAnalysis.Run(declaration, bound.Value.Model, mentioned, inputs.Policy, new RunSettings(inputs.Threads, inputs.Provenance.Seed));
        if (analysis.Value is not { } results)
        {
            return Reading<AuditRecord>.Failed(analysis.Problems);
        }

        var facts = AuditFacts.Of(results, bound.Value, inputs.Mentions, inputs.Policy);
        var outcome = RuleEngine.Evaluate(inputs.Rules, inputs.Policy, facts);
        return Reading<AuditRecord>.Of(Record(inputs, results, outcome));
    }

    private static AuditRecord Record(AuditInputs inputs, AuditResults results, RuleOutcome rules) => new(
        1,
        Model(inputs.Declaration),
        Outcome(results.Exclusions, rules.Findings),
        results.Rows,
        results.FinalFit,
        results.OtherFit,
        results.Exclusions,
        results.AllLeftOut,
        [],
        results.Checks,
        results.Influence,
        results.Collinearity,
        NotYet.Claims(inputs.Declaration),
        results.Elimination.Steps,
        rules.Findings,
        rules.Undecided,
        inputs.Policy.Effective,
        inputs.Provenance)
    {
        EliminationByRule = results.Elimination.ByRule,
        PolicyOverridden = inputs.Policy.Overridden,
        Plots = results.Plots,
    };

    private static ModelInfo Model(ModelDeclaration declaration) => new(
        declaration.Model.Id,
        declaration.Model.Title,
        declaration.Model.Version,
        declaration.Model.PreparedBy,
        declaration.Response.Label,
        [.. declaration.FinalModel.Terms.Select(term => term.Label)],
        declaration.FinalModel.Intercept);

    private static string Outcome(IReadOnlyList<Exclusion> exclusions, IReadOnlyList<Finding> findings)
    {
        var contradicted = exclusions.Any(exclusion =>
            exclusion is { Verdict: Verdicts.NotSupported, Materiality: not Materialities.ShownNegligible });
        return contradicted ? Outcomes.ExclusionsNotSupported
            : findings.Any(finding => finding.Severity >= Severity.Low) ? Outcomes.Findings
            : Outcomes.NothingFound;
    }
}

/// <summary>All that an audit depends on.</summary>
/// <param name="Mentions">Every data column that the declaration names.</param>
/// <param name="Threads">Most threads to compute with. No result depends on it.</param>
public sealed record AuditInputs(
    ModelDeclaration Declaration,
    IReadOnlyList<ColumnMention> Mentions,
    DataTable Table,
    Policy Policy,
    IReadOnlyList<Rule> Rules,
    Provenance Provenance,
    int Threads = 1);
