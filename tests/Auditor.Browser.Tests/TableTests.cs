using System.Globalization;
using System.Text.RegularExpressions;
using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>What the script adds to tables.</summary>
public sealed partial class TableTests(Chromium chromium, ITestOutputHelper output)
{
    /// <summary>Heading and body cells as a reader takes them: the full value where there is one, note letters off.</summary>
    private const string Cells = """
        table => [...table.rows].filter(row => !row.hidden).map(row => [...row.cells].map(cell => {
          const copy = cell.cloneNode(true);
          copy.querySelectorAll('sup').forEach(note => note.remove());
          return (copy.querySelector('span[title]')?.title ?? copy.textContent).replace(/\s+/g, ' ').trim();
        }))
        """;

    [Fact]
    public async Task Every_column_sorts_both_ways_by_the_full_value()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        int columns = 0;
        foreach (var table in await open.Page.Locator("table:has(button.sort)").AllAsync())
        {
            foreach (var heading in await table.Locator("thead th").AllAsync())
            {
                int column = await heading.EvaluateAsync<int>("heading => heading.cellIndex");
                await heading.Locator("button").ClickAsync();
                AssertSorted(await Column(table, column), 1);
                Assert.Equal("ascending", await heading.GetAttributeAsync("aria-sort"));

                await heading.Locator("button").ClickAsync();
                AssertSorted(await Column(table, column), -1);
                Assert.Equal("descending", await heading.GetAttributeAsync("aria-sort"));
                Assert.Equal(1, await table.Locator("[aria-sort]").CountAsync());
                columns++;
            }
        }

        output.WriteLine($"{columns} columns");
        Assert.True(columns > 40);
    }

    [Fact]
    public async Task Sorting_uses_more_than_is_shown()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        string[] full = await open.Ask<string[]>("() => [...document.querySelectorAll('table:has(button.sort) td span[title]')].filter(value => value.title !== value.textContent).map(value => value.title)");
        Assert.True(full.Length > 50);
    }

    [Fact]
    public async Task The_filter_shows_the_rows_that_hold_the_words_and_says_how_many()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var table = open.Page.Locator("#final-model table").First;
        var all = await table.EvaluateAsync<string[][]>(Cells);
        int wanted = all[1..].Count(row => row.Any(cell => cell.Contains("region", StringComparison.OrdinalIgnoreCase)));
        Assert.InRange(wanted, 2, all.Length - 2);

        await open.Page.Locator("#final-model input[type=search]").First.FillAsync("REGION");
        await Assertions.Expect(open.Page.GetByRole(AriaRole.Status)).ToHaveTextAsync($"{wanted} of {all.Length - 1} rows shown.");

        Assert.Equal(wanted, await table.Locator("tbody tr:visible").CountAsync());
        await open.Page.Locator("#final-model input[type=search]").First.FillAsync("");
        Assert.Equal(all.Length - 1, await table.Locator("tbody tr:visible").CountAsync());
    }

    [Fact]
    public async Task Every_table_copies_as_tab_separated_text_with_full_values()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var scrolls = await open.Page.Locator(".scroll").AllAsync();
        Assert.True(scrolls.Count > 8);
        foreach (var scroll in scrolls)
        {
            var cells = await scroll.Locator("table").EvaluateAsync<string[][]>(Cells);
            string name = await scroll.Locator("caption").InnerTextAsync();
            await open.Page.GetByRole(AriaRole.Status).EvaluateAsync("said => { said.textContent = ''; }");
            await scroll.Locator("xpath=preceding-sibling::div[contains(@class, 'tools')][1]").GetByText("Copy table").ClickAsync();
            await Assertions.Expect(open.Page.GetByRole(AriaRole.Status)).ToHaveTextAsync("Table copied.");

            string copied = await open.Ask<string>("() => navigator.clipboard.readText()");
            var rows = copied.TrimEnd('\n').Split('\n').Select(row => row.Split('\t')).ToList();
            Assert.Equal(cells.Length, rows.Count);
            Assert.All(rows.Zip(cells), pair => Assert.Equal(pair.Second.Select(AsNumber), pair.First));
            Assert.DoesNotMatch(SpacedNumber(), copied);
            Assert.False(string.IsNullOrEmpty(name));
        }
    }

    [Fact]
    public async Task Rows_that_the_filter_hides_are_not_copied()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        await open.Page.Locator("#final-model input[type=search]").First.FillAsync("region");
        await open.Page.Locator("#final-model").GetByText("Copy table").First.ClickAsync();
        await Assertions.Expect(open.Page.GetByRole(AriaRole.Status)).ToHaveTextAsync("Table copied.");

        var rows = (await open.Ask<string>("() => navigator.clipboard.readText()")).TrimEnd('\n').Split('\n');
        Assert.True(rows.Length > 2);
        Assert.All(rows[1..], row => Assert.Contains("region", row, StringComparison.Ordinal));
    }

    private static async Task<List<string>> Column(ILocator table, int column) =>
        [.. (await table.EvaluateAsync<string[][]>(Cells)).Skip(1).Select(row => row[column])];

    /// <summary>Numbers first, then words, what is missing last in either direction.</summary>
    private static void AssertSorted(List<string> cells, int direction)
    {
        var present = cells.TakeWhile(cell => cell != "none").ToList();
        Assert.DoesNotContain("none", cells.Skip(present.Count).Where(cell => cell != "none"));
        Assert.All(cells.Skip(present.Count), cell => Assert.Equal("none", cell));
        Assert.All(present.Zip(present.Skip(1)), pair => Assert.True(direction * Compare(pair.First, pair.Second) <= 0, $"{pair.First} before {pair.Second}"));
    }

    private static int Compare(string first, string second) => (Number(first), Number(second)) switch
    {
        ({ } a, { } b) => a.CompareTo(b),
        (null, null) => string.CompareOrdinal(first.ToLowerInvariant(), second.ToLowerInvariant()),
        (null, _) => 1,
        _ => -1,
    };

    private static double? Number(string text) =>
        double.TryParse(AsNumber(text.Split(" to ")[0]), NumberStyles.Float, CultureInfo.InvariantCulture, out double number) ? number : null;

    /// <summary>A number without the spaces between its thousands and with a plain minus sign; other text as it is.</summary>
    private static string AsNumber(string text) =>
        SpacedOrSigned().IsMatch(text) ? text.Replace(" ", "", StringComparison.Ordinal).Replace('\u2212', '-') : text;

    [GeneratedRegex("^[\u2212-]?[0-9]{1,3}( [0-9]{3})*([0-9]*)(\\.[0-9]+)?(e[-+\u2212]?[0-9]+)?$")]
    private static partial Regex SpacedOrSigned();

    [GeneratedRegex("(^|\t)[0-9]{1,3} [0-9]{3}(\t|$)", RegexOptions.Multiline)]
    private static partial Regex SpacedNumber();
}
