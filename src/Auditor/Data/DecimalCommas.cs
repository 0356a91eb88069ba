using System.Text.RegularExpressions;

namespace Auditor.Data;

/// <summary>Numbers written with a decimal comma would silently become levels: a column of them is refused unless its kind is declared.</summary>
internal static partial class DecimalCommas
{
    /// <summary>The problem of a column whose distinct texts are mostly such numbers, or null.</summary>
    public static Problem? In(string file, DataColumn column, ColumnRequest request)
    {
        if (request.Kind is not null || column is not LevelsColumn levels)
        {
            return null;
        }

        var commas = levels.Texts.Where(text => Number().IsMatch(text)).ToList();
        return 2 * commas.Count > levels.Texts.Count
            ? new Problem(file, null, $"column {column.Name}: cells such as {CellText.Shown(commas[0])} look like numbers with a decimal comma; write them with a decimal point, or declare kind: levels")
            : null;
    }

    [GeneratedRegex(@"^\s*[-+]?[0-9]+,[0-9]+\s*$")]
    private static partial Regex Number();
}
