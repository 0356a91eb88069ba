using System.Text.RegularExpressions;
using Auditor.Tests.Reporting;

namespace Auditor.Tests.Reference;

/// <summary>Pages of three reference cases, kept without style and script (the demo's kept page has them): the same in every culture.</summary>
public sealed partial class CasePageTests
{
    [Theory]
    [InlineData("air_quality")]
    [InlineData("pea_yield_npk")]
    [InlineData("us_consumption_lag")]
    public void The_page_is_the_golden_one_in_every_culture(string name)
    {
        string page = Page(name);

        Assert.All(["de-DE", "fa-IR"], culture => Assert.Equal(page, Cultures.In(culture, () => Page(name))));
        Golden.Matches(RoundedText.Of(StyleAndScript().Replace(page, "<$1>…</$1>")), name + ".html");
    }

    private static string Page(string name) =>
        Pages.Render(AuditRunner.Record(ReferenceFiles.FullPath($"{name}/declaration.yaml"), ReferenceFiles.ReadText("policy-reference.yaml")));

    [GeneratedRegex("<(style|script)>.*?</\\1>", RegexOptions.Singleline)]
    private static partial Regex StyleAndScript();
}
