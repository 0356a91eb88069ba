using Microsoft.Playwright;

namespace Auditor.Browser.Tests;

/// <summary>Everything can be done from the keyboard.</summary>
public sealed class KeyboardTests(Chromium chromium, ITestOutputHelper output)
{
    private const string NumberControls = """
        () => {
          const controls = [...document.querySelectorAll('a[href], button, input, select, summary, [tabindex="0"]')].filter(control => control.checkVisibility());
          controls.forEach((control, at) => { control.dataset.at = at; });
          return controls.length;
        }
        """;

    private const string Focused = """
        () => {
          const here = document.activeElement;
          const style = getComputedStyle(here);
          return here === document.body ? '' : here.dataset.at + (style.outlineStyle !== 'none' && parseFloat(style.outlineWidth) > 0 ? '' : ' unseen ' + here.outerHTML.slice(0, 100));
        }
        """;

    private const string Stop = "() => { const top = [...document.querySelectorAll('main > header, main > section, .exclusion')].filter(part => part === document.activeElement); return top[0]?.id ?? ''; }";

    [Theory]
    [InlineData(ReportPages.Demo, 1200)]
    [InlineData(ReportPages.Demo, 360)]
    public async Task Tab_reaches_every_control_in_order_and_shows_where_it_is(string page, int width)
    {
        await using var open = await chromium.Open(ReportPages.Named(page), new() { ViewportSize = new() { Width = width, Height = 800 } });
        int controls = await open.Ask<int>(NumberControls);
        output.WriteLine($"{controls} controls");
        Assert.True(controls > 50);

        var reached = new List<string>();
        for (int press = 0; press < controls; press++)
        {
            await open.Page.Keyboard.PressAsync("Tab");
            reached.Add(await open.Ask<string>(Focused));
        }

        Assert.Equal(Enumerable.Range(0, controls).Select(at => $"{at}"), reached);
    }

    [Fact]
    public async Task N_and_p_walk_through_every_part_and_back()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        string[] stops = await open.Ask<string[]>("() => [...document.querySelectorAll('main > header, main > section, section.exclusion')].map(part => part.id)");
        Assert.True(stops.Length > 20);

        var forth = await Walk(open.Page, "n", stops.Length);
        var back = await Walk(open.Page, "p", stops.Length - 1);

        Assert.Equal(stops[1..].Append(stops[^1]), forth);
        Assert.Equal(stops.Reverse().Skip(1), back);
    }

    [Fact]
    public async Task F_and_t_jump_again_and_again()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        for (int round = 0; round < 2; round++)
        {
            await open.Page.Keyboard.PressAsync("f");
            Assert.InRange(await Top(open.Page, "#findings"), 0, 60);
            await open.Page.Keyboard.PressAsync("t");
            Assert.InRange(await Top(open.Page, "#summary"), 0, 120);
        }
    }

    [Fact]
    public async Task After_a_jump_n_goes_on_from_there()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        await open.Page.Keyboard.PressAsync("f");
        Assert.Equal(["policy"], await Walk(open.Page, "n", 1));

        await open.Ask<object>("() => { document.activeElement.blur(); document.querySelector('#checks').scrollIntoView(); }");
        Assert.Equal(["influence"], await Walk(open.Page, "n", 1));
    }

    [Fact]
    public async Task The_checkbox_turns_the_keys_off_and_on()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var box = open.Page.GetByRole(AriaRole.Checkbox);
        await box.UncheckAsync();
        await open.Page.Keyboard.PressAsync("f");
        Assert.True(await Top(open.Page, "#findings") > 1000);

        await box.CheckAsync();
        await open.Page.Keyboard.PressAsync("f");
        Assert.InRange(await Top(open.Page, "#findings"), 0, 60);
    }

    [Fact]
    public async Task Keys_typed_into_a_field_are_text()
    {
        await using var open = await chromium.Open(ReportPages.Named(ReportPages.Demo));
        var field = open.Page.Locator("input[type=search]").First;
        await field.FocusAsync();
        double before = await Top(open.Page, "#findings");
        await open.Page.Keyboard.TypeAsync("npft");

        Assert.Equal("npft", await field.InputValueAsync());
        Assert.True(Math.Abs(await Top(open.Page, "#findings") - before) < 1000);
        Assert.True(await field.EvaluateAsync<bool>("field => document.activeElement === field"));
    }

    private static async Task<List<string>> Walk(IPage page, string key, int steps)
    {
        var met = new List<string>();
        for (int step = 0; step < steps; step++)
        {
            await page.Keyboard.PressAsync(key);
            met.Add(await page.EvaluateAsync<string>(Stop));
        }

        return met;
    }

    private static Task<double> Top(IPage page, string selector) => page.Locator(selector).EvaluateAsync<double>("part => part.getBoundingClientRect().top");
}
