using System.Globalization;

namespace Auditor.Reporting.Html;

/// <summary>All that the templates see: the record, and beside it what is made of it for readers.</summary>
internal sealed record ReportPage(AuditRecord Record)
{
    private const double UsualSignificance = 0.05;

    public double Level { get; } = Record.Policy.TryGetValue("significance", out object? value)
        ? Convert.ToDouble(value, CultureInfo.InvariantCulture)
        : UsualSignificance;

    public string Title => Record.Model.Title ?? Record.Model.Id;

    public string Outcome => OutcomeSentence.Of(Record);

    public IReadOnlyList<string> Beside => OutcomeSentence.Beside(Record);

    public string OpenFindings => OutcomeSentence.Findings(Record);

    public string Interval => NumberText.Percent(1 - (2 * Level));

    public IReadOnlyList<ExclusionPage> Exclusions => [.. Record.Exclusions.Select((exclusion, index) => ExclusionPage.Numbered(exclusion, index, Level))];

    public IntervalPicture? Picture => IntervalPicture.Of(Record.Exclusions);

    public ExclusionPage? Jointly => Record.AllLeftOut is { } all ? ExclusionPage.Of(all, "all-left-out", Level) : null;

    public FitPage FinalFit => FitPage.Of(Record.FinalFit, Level, "Coefficients");

    public FitPage? OtherFit => Record.OtherFit is { } other ? FitPage.Of(other, Level, "Coefficients on the other set of rows") : null;

    public ReportTable Entangled => AuditTables.Entangled(Record, Level);

    public ReportTable Checks => AuditTables.Checks(Record, Level);

    public IReadOnlyList<CheckConsequence> Consequences => CheckConsequence.Of(Record);

    public IReadOnlyList<ResidualPicture> ResidualPictures => Html.ResidualPictures.Of(Record, Level);

    public ReportTable Influence => AuditTables.Influence(Record.Influence);

    public ReportTable Collinearity => AuditTables.Collinearity(Record.Collinearity);

    public ReportTable Proportions => AuditTables.Proportions(Record.Collinearity);

    public ReportTable Claims => AuditTables.Claims(Record);

    public EliminationPage? Elimination => EliminationPage.Of(Record, Level);

    public ReportTable Rows => RowTables.Account(Record.Rows);

    public ReportTable Missing => RowTables.Missing(Record.Rows);

    public ReportTable Undefined => RowTables.Undefined(Record.Rows);

    public IReadOnlyList<FindingPage> Findings => FindingPage.Of(Record);

    public FactList Policy => FactList.Of([.. Record.Policy.Select(pair => new Fact(CheckWords.Spaced(pair.Key), PolicyCell(pair.Value), ShippedNote(pair.Key)))]);

    /// <summary>The words that make this page again, quoted for a shell.</summary>
    public string Command => string.Create(CultureInfo.InvariantCulture, $"./run-audit.sh {Quoted(Record.Provenance.Declaration)} --seed {Record.Provenance.Seed}");

    private string? ShippedNote(string name) =>
        Record.PolicyOverridden.TryGetValue(name, out object? shipped) ? "shipped: " + PolicyCell(shipped).Text : null;

    private static Cell PolicyCell(object value) => value is IFormattable number
        ? Cell.Number(Convert.ToDouble(number, CultureInfo.InvariantCulture)) with { Text = NumberText.Plain(Convert.ToDouble(number, CultureInfo.InvariantCulture)) }
        : Cell.Words(CheckWords.Spaced(Convert.ToString(value, CultureInfo.InvariantCulture) ?? ""));

    private static string Quoted(string path) => path.All(sign => char.IsAsciiLetterOrDigit(sign) || "._-/".Contains(sign, StringComparison.Ordinal))
        ? path
        : "'" + path.Replace("'", "'\\''", StringComparison.Ordinal) + "'";
}
