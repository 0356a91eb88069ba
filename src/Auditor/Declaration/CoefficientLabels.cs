using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Labels of coefficients as an author may have misspelt them.</summary>
internal static class CoefficientLabels
{
    /// <summary>A parenthesis naming the nearest label, empty when none is near.</summary>
    public static string DidYouMean(string label, IEnumerable<string> known) => NearestName.Of(label, known) is { } near ? $" (did you mean '{near}'?)" : "";
}
