using System.Globalization;
using System.Text.RegularExpressions;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>All that the templates see: the record, and beside it what is made of it for readers.</summary>
internal sealed record ReportPage(AuditRecord Record, PageScript Script)
{
    private const double UsualSignificance = 0.05;
    private const double UsualPower = 0.8;

    public double Level { get; } = Record.Policy.TryGetValue("significance", out object? value)
        ? Convert.ToDouble(value, CultureInfo.InvariantCulture)
        : UsualSignificance;

    private double Power => Record.Policy.TryGetValue("power", out object? value) ? Convert.ToDouble(value, CultureInfo.InvariantCulture) : UsualPower;

    public RowSetWords RowSets => RowSetWords.Of(Record.Policy);

    public string Title => Record.Model.Title ?? Record.Model.Id;

    public string Outcome => OutcomeSentence.Of(Record);

    public IReadOnlyList<string> Beside => OutcomeSentence.Beside(Record);

    public string OpenFindings => OutcomeSentence.Findings(Record);

    public string? FindingsAccepted => OutcomeSentence.Accepted(Record);

    public string Interval => NumberText.Percent(1 - (2 * Level));

    public IReadOnlyList<ExclusionPage> Exclusions => [.. Record.Exclusions.Select(Page)];

    public IntervalPicture? Picture => IntervalPicture.Of(Record.Exclusions);

    /// <summary>Verdicts at other levels and bounds, as JSON; null when there are none to try.</summary>
    public Markup? WhatIf => WhatIfValues.Of(Record);

    public ExclusionPage? Jointly => Record.AllLeftOut is { } all ? ExclusionPage.Of(all, "all-left-out", Level, alone: true) : null;

    /// <summary>A check contradicts what the classical standard errors need.</summary>
    public bool ClassicalDoubted => Record.Checks.Any(check => check is { Contradicts: true, Assumption: CheckFindings.EqualVariance or CheckFindings.Independence });

    public FitPage FinalFit => FitPage.Of(Record.FinalFit, Level, "Coefficients");

    public FitPage? OtherFit => Record.OtherFit is { } other ? FitPage.Of(other, Level, "Coefficients on " + RowSets.OtherOfModel) : null;

    public ReportTable Entangled => AuditTables.Entangled(Record, Level);

    /// <summary>What the checks that take rows as independent are worth here; null where no dependence is declared.</summary>
    public string? ChecksNeedIndependence => CheckWords.NeedIndependence(Record);

    public ReportTable Checks => AuditTables.Checks(Record, Level);

    public IReadOnlyList<CheckConsequence> Consequences => CheckConsequence.Of(Record);

    public IReadOnlyList<Picture> ResidualPictures => Html.ResidualPictures.Of(Record, Level);

    /// <summary>Rows through which the fit passes, named by their number in the source.</summary>
    public IReadOnlyList<string> LeverageOne => [.. Record.Influence.LeverageOne.Select(row => NumberText.Count(row))];

    public ReportTable Influence => AuditTables.Influence(Record.Influence);

    public ReportTable Collinearity => AuditTables.Collinearity(Record.Collinearity);

    public ReportTable Proportions => AuditTables.Proportions(Record.Collinearity);

    public string ClaimsSummary => ClaimWords.Summary(Record);

    public string? StandardErrors => ClaimWords.StandardErrors(Record);

    public ReportTable Claims => ClaimWords.Table(Record, Findings);

    public string ClaimRelations => ClaimWords.Relations(Record);

    public ReportTable ClaimContradictions => ClaimWords.Contradictions(Record);

    public EliminationPage? Elimination => EliminationPage.Of(Record, Level);

    public ReportTable Rows => RowTables.Account(Record.Rows);

    public ReportTable Missing => RowTables.Missing(Record.Rows);

    public ReportTable Undefined => RowTables.Undefined(Record.Rows);

    public IReadOnlyList<FindingPage> Findings => [.. FindingPage.Of(Record).Where(finding => finding.Accepted is null)];

    public IReadOnlyList<FindingPage> AcceptedFindings => [.. FindingPage.Of(Record).Where(finding => finding.Accepted is not null)];

    /// <summary>Rules that could not decide, those with one reason together.</summary>
    public IReadOnlyList<UndecidedPage> Undecided =>
    [
        .. Record.Undecided.GroupBy(item => (item.Rule, item.Why)).Select(group => new UndecidedPage(group.Key.Rule, [.. group.Select(item => FindingPage.SubjectWords(item.Subject, Record))], UndecidedPage.WithoutNames(group.Key.Why))),
    ];

    public FactList Policy => FactList.Of([.. Record.Policy.Select(pair => new Fact(CheckWords.Spaced(pair.Key), PolicyCell(pair.Value), ShippedNote(pair.Key)))]);

    /// <summary>The words that make this page again, quoted for a shell.</summary>
    public string Command => string.Create(CultureInfo.InvariantCulture, $"./run-audit.sh {Quoted(Record.Provenance.Declaration)} --seed {Record.Provenance.Seed}{Acceptances}");

    private string Acceptances =>
        (Record.Provenance.Acceptances is { } file ? " --acceptances " + Quoted(file) : "") + (Record.Provenance.AsOf is { } day ? " --as-of " + day : "");

    private ExclusionPage Page(Exclusion exclusion, int index)
    {
        var page = ExclusionPage.Numbered(exclusion, index, Level, Record.Exclusions.Count == 1);
        var inParts = Divisions.Subjects(exclusion).ToHashSet(StringComparer.Ordinal);
        return page with
        {
            Reported = ClaimWords.TableOf(exclusion.Group, Record, Findings),
            Next = [.. Findings.Where(finding => (finding.Finding.Subject == exclusion.Group || inParts.Contains(finding.Finding.Subject)) && finding.Finding.Advice.Length > 0)],
            Pictures = ExclusionPictures.Of(exclusion, Record.Plots?.Groups.ElementAtOrDefault(index), page.Anchor, Power, Record.Plots?.Plots?.Weighted ?? false),
        };
    }

    private string? ShippedNote(string name) =>
        Record.PolicyOverridden.TryGetValue(name, out object? shipped) ? "shipped: " + PolicyCell(shipped).Text : null;

    private static Cell PolicyCell(object value) => value is IFormattable number
        ? Cell.Number(Convert.ToDouble(number, CultureInfo.InvariantCulture)) with { Text = NumberText.Plain(Convert.ToDouble(number, CultureInfo.InvariantCulture)) }
        : Cell.Words(Convert.ToString(value, CultureInfo.InvariantCulture) switch
        {
            "holm" => "Holm",
            "hc3" => "robust HC3 test",
            "own" => "each group’s own rows",
            "common" => "rows common to all groups",
            var words => CheckWords.Spaced(words ?? ""),
        });

    private static string Quoted(string path) => path.All(sign => char.IsAsciiLetterOrDigit(sign) || "._-/".Contains(sign, StringComparison.Ordinal))
        ? path
        : "'" + path.Replace("'", "'\\''", StringComparison.Ordinal) + "'";
}

/// <summary>A rule that could not decide for want of a fact, with all subjects of which the same fact is missing.</summary>
internal sealed partial record UndecidedPage(string Rule, IReadOnlyList<string> Subjects, string Why)
{
    /// <summary>The reasons alone, each once: the record names the facts.</summary>
    public static string WithoutNames(string why) => string.Join("; ", NamedFact().Replace(why, "\n").Split('\n', StringSplitOptions.RemoveEmptyEntries).Distinct());

    [GeneratedRegex(@"(?:; |\A)[a-z0-9_]+ could not be computed: ")]
    private static partial Regex NamedFact();
}
