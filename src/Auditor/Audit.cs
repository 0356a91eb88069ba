using Auditor.Acceptances;
using Auditor.Analysis;
using Auditor.Data;
using Auditor.Declaration;
using Auditor.Design;
using Auditor.Facts;
using Auditor.Findings;
using Auditor.Numerics.Storage;
using Auditor.Policies;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.Rules;

namespace Auditor;

/// <summary>
/// The audit, values in and values out: declaration and data, bound terms and row sets, fits and tests, facts, rules, findings, acceptances, record. No step reads
/// or writes a file.
/// </summary>
public static class Audit
{
    /// <summary>The record, or the problems that keep the declaration from being audited on these data.</summary>
    public static Reading<AuditRecord> Run(AuditInputs inputs)
    {
        var declaration = inputs.Declaration;
        inputs.Steps?.Report(AuditStep.Terms);
        var bound = ModelBinder.Bind(declaration, inputs.Table);
        if (bound.Value is null)
        {
            return Reading<AuditRecord>.Failed(bound.Problems);
        }

        var mentioned = inputs.Mentions.Select(mention => mention.Column).ToHashSet(StringComparer.Ordinal);
        var analysis = ModelAnalysis.Run(declaration, bound.Value.Model, mentioned, inputs.Policy, new RunSettings(inputs.Threads, inputs.Provenance.Seed, inputs.Pictures, inputs.Steps) { Store = inputs.Store });
        if (analysis.Value is not { } results)
        {
            return Reading<AuditRecord>.Failed(analysis.Problems);
        }

        inputs.Steps?.Report(AuditStep.Rules);
        var facts = AuditFacts.Of(results, bound.Value, inputs.Mentions, inputs.Policy);
        var found = RuleEngine.Evaluate(inputs.Rules, inputs.Policy, facts);
        return Reading<AuditRecord>.Of(Record(inputs, results, Accepted(inputs, found, facts)));
    }

    /// <summary>What is said of acceptances is said last, of findings that stand: no acceptance can reach it.</summary>
    private static RuleOutcome Accepted(AuditInputs inputs, RuleOutcome found, IReadOnlyList<FactSet> facts)
    {
        var model = inputs.Declaration.Model;
        var matched = AcceptanceMatching.Of(inputs.Acceptances, model.Id, model.Version, found.Findings, facts, inputs.Rules);
        var said = RuleEngine.Evaluate(inputs.Rules, inputs.Policy, [.. matched.Standings.Select(AcceptanceFacts.From)]);
        return (found with { Findings = matched.Findings }).Then(said);
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
        results.Claims.Figures,
        results.Elimination.Steps,
        rules.Findings,
        rules.Undecided,
        inputs.Policy.Effective,
        inputs.Provenance)
    {
        StandardErrorsReproducedBy = results.Claims.StandardErrors,
        ClaimsAgainstEachOther = results.Claims.AgainstEachOther,
        EliminationByRule = results.Elimination.ByRule,
        PolicyOverridden = inputs.Policy.Overridden,
        Structure = results.Structure,
        Plots = results.Plots,
        WhatIf = results.WhatIf,
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
    int Threads = 1)
{
    /// <summary>Whether the points of the pictures are gathered; no figure depends on it.</summary>
    public bool Pictures { get; init; } = true;

    /// <summary>Where what has one value a row is kept; no figure depends on it.</summary>
    public CellStore Store { get; init; } = CellStore.Memory;

    /// <summary>Findings that a named approver has accepted.</summary>
    public AcceptancesOfRun Acceptances { get; init; } = AcceptancesOfRun.None;

    /// <summary>Told when each step begins; no figure depends on it.</summary>
    public IProgress<AuditStep>? Steps { get; init; }
}

/// <summary>The parts of an audit's work, in their order; each is reported when it begins.</summary>
public enum AuditStep
{
    Terms,
    RowSets,
    Fits,
    Influence,
    Checks,
    Pictures,
    Groups,
    Rules,
}
