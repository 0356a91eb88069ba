using System.Net;
using System.Text;
using System.Text.RegularExpressions;
using Auditor.Reporting;

namespace Auditor.Tests.Reporting;

public sealed partial class HtmlReportTests
{
    private static readonly string[] Sections =
    [
        "summary", "verdicts", "exclusions", "jointly", "checks", "influence", "collinearity", "final-model",
        "claims", "elimination", "rows", "findings", "policy", "provenance", "cautions",
    ];

    [Fact]
    public void The_sample_page_is_the_golden_one() => Golden.Matches(Pages.Render(SampleRecords.Full), "sample.html");

    [Fact]
    public void The_page_of_a_record_of_nulls_is_the_golden_one() => Golden.Matches(Pages.Render(SampleRecords.MostlyNull), "nulls.html");

    [Fact]
    public void Every_section_is_there_in_reading_order()
    {
        string page = Pages.Render(SampleRecords.Full);

        int[] places = [.. Sections.Select(id => page.IndexOf($"id=\"{id}\"", StringComparison.Ordinal))];

        Assert.DoesNotContain(-1, places);
        Assert.Equal(places.Order(), places);
    }

    [Fact]
    public void A_record_of_nulls_has_every_section_too()
    {
        string page = Pages.Render(SampleRecords.MostlyNull);

        Assert.All(Sections, id => Assert.Contains($"id=\"{id}\"", page, StringComparison.Ordinal));
        Assert.Contains("The response does not vary.", page, StringComparison.Ordinal);
    }

    [Fact]
    public void No_cell_and_no_value_is_blank() =>
        Assert.All(
            new[] { SampleRecords.Full, SampleRecords.MostlyNull, SampleRecords.WithoutFindings },
            record => Assert.DoesNotMatch(BlankValue(), Pages.Render(record)));

    [Fact]
    public void Every_exclusion_and_every_finding_is_there()
    {
        string page = WebUtility.HtmlDecode(Pages.Render(SampleRecords.Full));

        Assert.All(SampleRecords.Full.Exclusions, exclusion => Assert.Contains($">{exclusion.Group}</h3>", page, StringComparison.Ordinal));
        Assert.All(SampleRecords.Full.Exclusions, exclusion => Assert.Contains(exclusion.Reason, page, StringComparison.Ordinal));
        Assert.All(SampleRecords.Full.Findings, finding => Assert.Contains(finding.Message, page, StringComparison.Ordinal));
        Assert.Equal(SampleRecords.Full.Findings.Count, Regex.Count(page, "<li class=\"severity-"));
    }

    [Fact]
    public void Text_of_the_record_never_becomes_markup()
    {
        const string attack = "\"><img src=x onerror='a'>&amp;{{ page }}";

        string page = Pages.Render(HostileRecords.Of(attack));

        Assert.DoesNotContain("<img", page, StringComparison.Ordinal);
        Assert.Equal(Regex.Count(Pages.Render(HostileRecords.Of("plain")), "<script"), Regex.Count(page, "<script"));
        string encoded = WebUtility.HtmlEncode(attack);
        Assert.True(Regex.Count(page, Regex.Escape(encoded)) > 40);
        Assert.DoesNotContain(WebUtility.HtmlEncode(encoded), page, StringComparison.Ordinal);
    }

    [Fact]
    public void The_page_refers_to_nothing_outside_itself()
    {
        string page = Pages.Render(SampleRecords.Full);

        Assert.DoesNotMatch(OutsideReference(), page);
        Assert.True(Regex.Count(page, "href=\"#") > 20);
        Assert.DoesNotMatch("(?i)fetch\\(|XMLHttpRequest|WebSocket|sendBeacon|import\\(", page);
    }

    [Fact]
    public void Every_link_leads_somewhere_on_the_page()
    {
        string page = Pages.Render(SampleRecords.Full);

        Assert.All(
            Regex.Matches(page, "href=\"#([^\"]+)\"").Select(match => match.Groups[1].Value),
            id => Assert.Single(Regex.Matches(page, $" id=\"{Regex.Escape(id)}\"")));
    }

    [Fact]
    public void A_page_longer_than_a_mebibyte_is_not_cut()
    {
        string page = Pages.Render(SampleRecords.Long);

        Assert.True(Encoding.UTF8.GetByteCount(page) > 2 << 20);
        Assert.EndsWith("</html>\n", page, StringComparison.Ordinal);
        Assert.Equal(400, Regex.Count(page, "<section class=\"exclusion\""));
    }

    [Theory]
    [InlineData("de-DE")]
    [InlineData("tr-TR")]
    [InlineData("")]
    public void The_page_does_not_depend_on_the_culture(string culture) =>
        Assert.Equal(Pages.Render(SampleRecords.Full), Cultures.In(culture, () => Pages.Render(SampleRecords.Full)));

    [Fact]
    public void No_p_is_printed_as_zero() => Assert.DoesNotMatch(@">0\.0+<", Pages.Render(SampleRecords.Full));

    [Fact]
    public void Every_template_is_used()
    {
        var read = new HashSet<string>();

        _ = new HtmlReport(name =>
        {
            read.Add(name);
            return Pages.Template(name);
        }).Render(SampleRecords.Full);

        string[] shipped = [.. Directory.GetFiles(Path.Combine(Repository.Root, "templates", "report")).Select(file => Path.GetFileName(file))];
        Assert.True(shipped.Length > 20);
        Assert.Equal(shipped.Order(StringComparer.Ordinal), read.Order(StringComparer.Ordinal));
    }

    [GeneratedRegex("<(td|th|dd|h[1-4])[^>]*>\\s*</\\1>")]
    private static partial Regex BlankValue();

    [GeneratedRegex("(?i)<(link|img|iframe|object|embed|base)\\b|\\bsrc=|href=\"(?!#)|url\\(|@import|https?://|\\bon[a-z]+=\"")]
    private static partial Regex OutsideReference();
}
