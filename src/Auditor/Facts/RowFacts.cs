using System.Globalization;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>The facts of where every row of the source went, and of the declared structure of those used.</summary>
public static class RowFacts
{
    private static readonly FactFamily<RowAccount> Family = new FactFamily<RowAccount>(About.Rows)
        .Count("read", FactUnits.Rows, "Rows of the source.", rows => rows.Read)
        .Count("filtered_out", FactUnits.Rows, "Rows the declared filter takes out.", rows => rows.FilteredOut)
        .Number("filtered_out_share", FactUnits.Share, "filtered_out as a share of the rows read.", rows => Share(rows.FilteredOut, rows.Read), NoRows)
        .Count("zero_weight", FactUnits.Rows, "Rows with weight 0.", rows => rows.ZeroWeight)
        .Flag("has_zero_weight", "At least one row has weight 0.", rows => rows.ZeroWeight > 0)
        .Count("kept", FactUnits.Rows, "Rows left by the filter and the weights.", rows => Kept(rows))
        .Count("incomplete", FactUnits.Rows, "Kept rows with a missing value in a column of the model.", rows => rows.Incomplete)
        .Number("incomplete_share", FactUnits.Share, "incomplete as a share of the kept rows.", rows => Share(rows.Incomplete, Kept(rows)), NoRows)
        .Text("missing_by_column", "Columns with missing cells, the most missing first.", rows => Listed(rows.MissingByColumn))
        .Count("undefined", FactUnits.Rows, "Kept rows where a transform has no value although its columns do.", rows => rows.Undefined)
        .Flag("has_undefined", "There is at least one such row.", rows => rows.Undefined > 0)
        .Text("undefined_by_term", "Terms without a value in some rows, the most first.", rows => Listed(rows.UndefinedByTerm))
        .Count("used", FactUnits.Rows, "Rows of the final model's fit.", rows => rows.Used)
        .Flag("nothing_lost", "Every row read is used.", rows => rows.Used == rows.Read);

    public static IReadOnlyList<FactDefinition> Definitions => [.. Family.Definitions, .. StructureFacts.Definitions];

    public static FactSet From(string modelId, RowAccount rows, StructureCounts structure)
    {
        var account = Family.From(rows, modelId, null);
        return account with { Values = new OrderedDictionary<string, FactValue>(account.Values.Concat(StructureFacts.Values(structure)), StringComparer.Ordinal) };
    }

    private static int Kept(RowAccount rows) => rows.Read - rows.FilteredOut - rows.ZeroWeight;

    private static double? Share(int part, int whole) => whole > 0 ? (double)part / whole : null;

    private static string NoRows(RowAccount rows) => "there is no row to take a share of";

    private static string Listed(IReadOnlyDictionary<string, int> counts) => string.Join(", ", counts
        .Where(pair => pair.Value > 0)
        .OrderByDescending(pair => pair.Value)
        .ThenBy(pair => pair.Key, StringComparer.Ordinal)
        .Select(pair => string.Create(CultureInfo.InvariantCulture, $"{pair.Key} ({pair.Value:#,0})")));
}
