using System.Globalization;
using System.Text;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>An aliased column with the combination it equals, in labels.</summary>
internal static class AliasedWord
{
    public static AliasedColumn Of(Numerics.Factor.AliasedColumn column, IReadOnlyList<string> labels)
    {
        var text = new StringBuilder();
        if (column.Constant != 0 || column.Parts.Count == 0)
        {
            text.Append(Number(column.Constant));
        }

        foreach (var part in column.Parts)
        {
            Append(text, part.Coefficient, labels[part.Column]);
        }

        return new AliasedColumn(labels[column.Column], text.ToString());
    }

    private static void Append(StringBuilder text, double coefficient, string label)
    {
        var size = Number(Math.Abs(coefficient));
        text.Append(text.Length == 0 ? (coefficient < 0 ? "-" : "") : coefficient < 0 ? " - " : " + ");
        text.Append(size == "1" ? label : size + " * " + label);
    }

    /// <summary>Nine digits: a combination is known to about that many.</summary>
    private static string Number(double value) => value.ToString("G9", CultureInfo.InvariantCulture);
}
