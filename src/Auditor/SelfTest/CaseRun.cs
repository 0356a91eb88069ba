using System.Globalization;
using System.Text.Json;

namespace Auditor.SelfTest;

/// <summary>A reference case beside the record of auditing one of its declarations.</summary>
/// <param name="Variant">The ending of the declaration: empty, -largest, -powers, -largest-powers.</param>
internal sealed record CaseRun(ReferenceCase Case, string Variant, RecordView Record)
{
    /// <summary>The declaration has the largest model as its final one and leaves nothing out.</summary>
    public bool IsLargest => Variant.Contains("-largest", StringComparison.Ordinal);

    private bool FormsPowers => Variant.Contains("-powers", StringComparison.Ordinal);

    public string FitName => IsLargest ? "largest_model" : "final_model";

    public JsonElement Fit => Case.Values.GetProperty(FitName);

    public JsonElement? ExactFit => Case.Exact.Optional(FitName);

    /// <summary>The record's label of a column that case.json calls by its own conventions: <c>a[l]:b</c> is <c>a = l * b</c>.</summary>
    public string Label(string column) => column == "(intercept)" ? "intercept" : string.Join(" * ", column.Split(':').Select(Part));

    /// <summary>NIST certifies values for this declaration's final model.</summary>
    public bool IsCertified => Case.Name.StartsWith("nist_", StringComparison.Ordinal) && IsLargest == Case.Name is not ("nist_norris" or "nist_noint1");

    /// <summary>Every figure of the record that the case's own files hold.</summary>
    public IReadOnlyList<Figure> Figures() =>
    [
        .. FitFigures.Of(this),
        .. CoefficientFigures.Of(this),
        .. GroupFigures.Of(this),
        .. ResidualCheckFigures.Of(this),
        .. InfluenceFigures.Of(this),
        .. IsCertified ? CertifiedFigures.Of(this) : [],
    ];

    private string Part(string part)
    {
        int bracket = part.IndexOf('[', StringComparison.Ordinal);
        return bracket >= 0 ? part[..bracket] + " = " + part[(bracket + 1)..^1] : Power(part);
    }

    private string Power(string column) =>
        FormsPowers && column.Length > 1 && column[0] == 'x' && int.TryParse(column.AsSpan(1), CultureInfo.InvariantCulture, out int power)
            ? string.Create(CultureInfo.InvariantCulture, $"x^{power}")
            : column;
}
