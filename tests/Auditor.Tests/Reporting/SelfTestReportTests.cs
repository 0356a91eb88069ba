using System.Text.Json;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.Tests.SelfTest;

namespace Auditor.Tests.Reporting;

public sealed class SelfTestReportTests
{
    private const string Attack = "\"><img src=x>&amp;{{ page }}";

    private static readonly SelfTestRecord Sample = new(1, false, SelfTestRecord.WhatItShows, ShippedCases.Installation,
    [
        new("a-case", "A title", ["a source", Attack], false, null,
        [
            new("coefficient estimate", "x", 1.5, 1.5, false, 16, 12, true),
            new("coefficient estimate", "y", 2.5, 2.6, false, 1.4, 12, false),
            new("hc2 absent", "g", null, null, false, null, null, true),
            new("classical p", "g", -400.5, -400.5, true, 16, 10, true),
            new("hc3 f", "nothing was compared", null, null, false, null, 9, false),
        ]),
        new("broken", "broken", [], false, Attack, []),
    ]);

    [Fact]
    public void The_json_holds_every_quantity_with_digits_floor_and_result()
    {
        using var json = JsonDocument.Parse(SelfTestReport.Json(Sample));
        JsonElement quantities = json.RootElement.GetProperty("cases")[0].GetProperty("quantities");

        Assert.False(json.RootElement.GetProperty("passed").GetBoolean());
        Assert.Equal("a runtime", json.RootElement.GetProperty("installation").GetProperty("runtime").GetString());
        Assert.Equal("X64", json.RootElement.GetProperty("installation").GetProperty("processor_architecture").GetString());
        Assert.Equal(5, quantities.GetArrayLength());
        Assert.Equal((1.4, 12, false), (quantities[1].GetProperty("digits").GetDouble(), quantities[1].GetProperty("floor").GetInt32(), quantities[1].GetProperty("passed").GetBoolean()));
    }

    [Fact]
    public void The_page_is_well_formed_and_says_what_it_is()
    {
        string page = Page(Sample);
        XElement root = XElement.Parse(Closed(page));

        Assert.Equal(["summary", "cases", "case-a-case", "case-broken"], root.Descendants().Where(element => element.Name.LocalName is "header" or "section").Select(element => element.Attribute("id")!.Value));
        Assert.Contains("2 of 2 cases do not agree", page, StringComparison.Ordinal);
        Assert.Contains("no approval of any model", page, StringComparison.Ordinal);
        Assert.DoesNotContain("<img", page, StringComparison.Ordinal);
        Assert.DoesNotMatch("<(td|th|dd|h[1-4])[^>]*>\\s*</\\1>", page);
    }

    [Fact]
    public void A_line_shows_the_worst_of_its_kind()
    {
        string[] rows = [.. Regex.Matches(Page(Sample), "<tr>.*?</tr>", RegexOptions.Singleline).Select(row => Regex.Replace(row.Value, "<[^>]*>", " "))];

        Assert.Contains(rows, row => Regex.IsMatch(row, "coefficient estimate +2 +1.4 +12 +y +2.5 +2.6 +does not agree"));
        Assert.Contains(rows, row => row.Contains("log10: -400.5", StringComparison.Ordinal));
    }

    [Fact]
    public void The_page_does_not_depend_on_the_culture() => Assert.Equal(Page(Sample), Cultures.In("de-DE", () => Page(Sample)));

    private static string Page(SelfTestRecord record) => SelfTestReport.Html(record, name =>
        File.Exists(Path.Combine(Repository.Root, "templates", "self-test", name)) ? Repository.Text("templates", "self-test", name) : Pages.Template(name));

    /// <summary>HTML's elements without an end, closed as XML wants it.</summary>
    private static string Closed(string page) => Regex.Replace(page.Replace("<!DOCTYPE html>", "", StringComparison.Ordinal), "<meta ([^>]*)>", "<meta $1/>");
}
