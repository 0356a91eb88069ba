using System.Globalization;
using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>All that the templates of the self-test see.</summary>
internal sealed record SelfTestPage(SelfTestRecord Record)
{
    public string Outcome => Record.Passed
        ? "Every case agrees to the digits asked for"
        : string.Create(CultureInfo.InvariantCulture, $"{Record.Cases.Count(one => !one.Passed)} of {Record.Cases.Count} cases do not agree to the digits asked for");

    public string Compared => string.Create(
        CultureInfo.InvariantCulture, $"{NumberText.Count(Record.Cases.Sum(one => one.Quantities.Count))} quantities in {Record.Cases.Count} cases");

    public ReportTable Summary => ReportTable.Of(
        "Cases",
        Record.Cases,
        new("Case", "name", one => Cell.Name(one.Id)),
        new("What it is", "text", one => Cell.Words(one.Title)),
        new("Quantities", "number", one => Cell.Count(one.Quantities.Count)),
        new("Fewest digits", "number", one => Fewest(one.Quantities)),
        new("Result", "text", one => Result(one.Passed)));

    public IReadOnlyList<CasePage> Cases => [.. Record.Cases.Select(one => new CasePage(one))];

    internal static Cell Result(bool passed) => Cell.Words(passed ? "agrees" : "does not agree");

    /// <summary>Over the numbers that exist.</summary>
    internal static Cell Fewest(IEnumerable<SelfTestQuantity> quantities)
    {
        var digits = quantities.Select(quantity => quantity.Digits).OfType<double>().DefaultIfEmpty(double.NaN).Min();
        return double.IsNaN(digits) ? Cell.Missing("No number could be compared.") : Cell.Tenths(digits);
    }
}

/// <summary>One case, a line for each kind of quantity.</summary>
internal sealed record CasePage(SelfTestCase Case)
{
    private const string Absent = "The number does not exist, and none is given.";

    public string Anchor => "case-" + Case.Id;

    public ReportTable Kinds => ReportTable.Of(
        "What was compared in " + Case.Id,
        Case.Quantities.GroupBy(quantity => quantity.Kind).Select(kind => new Kind(kind.Key, [.. kind])),
        new("Quantity", "text", kind => Cell.Words(CheckWords.Spaced(kind.Name))),
        new("Compared", "number", kind => Cell.Count(kind.Quantities.Count)),
        new("Fewest digits", "number", kind => kind.Worst.Digits is null && kind.Worst.Passed ? Cell.Missing(Absent) : SelfTestPage.Fewest([kind.Worst])),
        new("Floor", "number", kind => kind.Worst.Floor is null && kind.Worst.Passed ? Cell.Missing(Absent) : Cell.Count(kind.Worst.Floor, "No floor is kept for this quantity.")),
        new("Where", "name", kind => Cell.Name(kind.Where)),
        new("Expected there", "number", kind => Value(kind.Worst.Expected, kind.Worst.Log10)),
        new("Found there", "number", kind => Value(kind.Worst.Found, kind.Worst.Log10)),
        new("Result", "text", kind => SelfTestPage.Result(kind.Quantities.All(quantity => quantity.Passed))));

    private static Cell Value(double? value, bool log10) => value is double number
        ? Cell.Number(number) with { Text = (log10 ? "log10: " : "") + NumberText.Full(number), Full = null }
        : Cell.Missing(Absent);

    private sealed record Kind(string Name, IReadOnlyList<SelfTestQuantity> Quantities)
    {
        /// <summary>A number that is missing, else the one with the fewest digits.</summary>
        public SelfTestQuantity Worst => Quantities.OrderBy(quantity => quantity.Passed).ThenBy(quantity => quantity.Digits ?? double.NegativeInfinity).First();

        public string Where => Worst.Where.Length > 0 ? Worst.Where : "the fit";
    }
}
