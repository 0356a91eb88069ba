using Auditor.Data;

namespace Auditor.Starting;

/// <summary>The lines of a first declaration.</summary>
internal static class DeclarationText
{
    /// <summary>Where comments begin, when the line is shorter.</summary>
    private const int CommentColumn = 40;

    /// <param name="unusable">Names in the header that are blank or stand twice.</param>
    public static string Of(StartRequest request, ColumnProfile response, IReadOnlyList<TermChoice> choices, IReadOnlyList<string> unusable)
    {
        var label = choices.FirstOrDefault(choice => choice.Column is { Kind: ColumnKind.Levels, IsUnique: true })?.Column;
        string[] lines =
        [
            $"# A first declaration, written from the columns of {YamlText.Comment(request.Source)}. It can be audited as it stands.",
            "# Make it say what your report says: keep under final_model what stayed in the model, and move what was left out",
            "# into groups under left_out. Take the mark # away from a line to use it.",
            Line("audit: 1", "version of this format"),
            "",
            "model:",
            Line("  id: " + request.Id, "names the report's files: letters, digits, hyphens"),
            Line("  # title: Loss rate on tractor leases", "as it stands on your report"),
            Line("  # version: \"1\"", "of the model"),
            Line("  # prepared_by: Model development"),
            "",
            "data:",
            Line("  source: " + YamlText.Of(request.Source), "relative to this file"),
            Line("  # sha256: " + request.Sha256, "refuses any other file"),
            label is null
                ? Line("  # row_label: lease_no", "the column that names a row in the report")
                : Line("  row_label: " + YamlText.Of(label.Name), "names a row in the report: a text of its own in every row"),
            .. Columns([.. choices.Where(choice => choice.Doubt?.Kind is not null && choice.Column != label)]),
            Line("  # missing: [\"\", NA, NaN, \"null\"]", "texts that mean \"no value\"; these unless you say others"),
            Line("  # keep:", "only rows that meet every condition"),
            Line("  #   - {column: status, equals: closed}", "or not, in, from and to, present: true"),
            "  # Which rows depend on each other decides the test, and nothing in the data tells it. Without time or cluster every row counts as independent.",
            .. StructureLines.Of([.. choices.Select(choice => choice.Column)]).Select(line => Line("  # " + line.Text, line.Note)),
            "",
            Line("response: " + YamlText.Of(response.Name), TermChoice.Described(response)),
            "",
            "final_model:",
            Line("  # intercept: false", "the constant is in the model unless this says otherwise"),
            .. Terms(choices),
            .. unusable.Count == 0 ? Array.Empty<string>() : [Line("    # not usable: " + YamlText.Comment(Named(unusable)), "no name of its own in the header")],
            "",
            Line("# left_out:", "what was tried and dropped: a group for each reason, tested as a whole"),
            Line("#   - group: engine condition", "a name of your own"),
            Line("#     terms: [engine_hours, {square: engine_hours}]", "moved here from final_model"),
            Line("#     because: Not significant at 5 %.", "as your report says"),
            Line("#     reported: {f: 0.71, df: [2, 480], p: 0.49}", "figures as printed, digits kept"),
            "",
            Line("# reported:", "figures of the final model as printed, digits kept"),
            Line("#   rows_used: 512"),
            Line("#   r_squared: 0.413"),
        ];
        return string.Join('\n', lines) + "\n";
    }

    private static IEnumerable<string> Columns(IReadOnlyList<TermChoice> doubted) => doubted.Count == 0
        ? []
        : doubted
            .Select(choice => Line($"  #   {YamlText.Of(choice.Column.Name)}: {{kind: {Word(choice.Doubt!.Kind!.Value)}}}", choice.Note))
            .Prepend(Line("  # columns:", "kinds that the cells leave in doubt; the others show in the cells"));

    private static IEnumerable<string> Terms(IReadOnlyList<TermChoice> choices) => choices
        .Select(choice => Line($"    {(choice.Doubt is null ? "" : "# ")}- {YamlText.Of(choice.Column.Name)}", choice.Note))
        .Prepend(Line(
            choices.Any(choice => choice.Doubt is null) ? "  terms:" : "  terms: []",
            "{log: price}, {product: [a, b]} and others are terms too"));

    private static string Named(IReadOnlyList<string> names) => string.Join(", ", names.Distinct(StringComparer.Ordinal).Select(name => CellText.Shown(name)));

    private static string Line(string text, string? comment = null) =>
        comment is null ? text : text.PadRight(CommentColumn - 2) + "  # " + YamlText.Comment(comment);

    private static string Word(ColumnKind kind) => kind switch
    {
        ColumnKind.Levels => "levels",
        ColumnKind.Date => "date",
        ColumnKind.Text => "text",
        _ => "number",
    };
}
