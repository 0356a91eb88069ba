using System.Globalization;
using Auditor.Results;

namespace Auditor.Facts;

/// <summary>Lists of columns and rows as text.</summary>
internal static class ColumnLists
{
    public static string Aliased(IReadOnlyList<AliasedColumn> columns) =>
        string.Join("; ", columns.Select(column => $"{column.Column} equals {column.Combination}"));

    public static string Names(IReadOnlyList<NearlyAliasedColumn> columns) => string.Join(", ", columns.Select(column => column.Column));

    public static string Numbers(IReadOnlyList<int> rows) =>
        string.Join(", ", rows.Select(row => row.ToString(CultureInfo.InvariantCulture)));

    public static double? MostDigitsLost(IReadOnlyList<NearlyAliasedColumn> columns) =>
        columns.Count == 0 ? null : columns.Max(column => column.DigitsLost);

    public static string NoneNearlyAliased<T>(T source) => "no column is nearly aliased";
}
