using Auditor.Reporting.Html;
using Scriban.Syntax;

namespace Auditor.Tests.Reporting;

public sealed class TemplateSetTests
{
    [Theory]
    [InlineData("fine\n{{ nobody_knows }}")]
    [InlineData("fine\n{{ page.nobody_knows }}")]
    [InlineData("fine\n{{ nobody_knows 1 }}")]
    [InlineData("fine\n{{ date.now }}")]
    [InlineData("fine\n{{ 'a' | regex.match 'a' }}")]
    [InlineData("fine\n{{ object.eval_template 'a' }}")]
    public void An_unknown_or_removed_name_is_an_error_with_file_and_line(string template)
    {
        var fault = Assert.Throws<ScriptRuntimeException>(() => Render(("page.html", template)));

        Assert.StartsWith("page.html(2,", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void An_unknown_name_in_an_included_template_names_that_file()
    {
        var fault = Assert.Throws<ScriptRuntimeException>(() => Render(("page.html", "{{ include 'part.html' }}"), ("part.html", "\n\n{{ nobody_knows }}")));

        Assert.Contains("part.html(3,", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Capture_is_refused_with_its_place()
    {
        var fault = Assert.Throws<InvalidOperationException>(() => Render(("page.html", "\n{{ capture text }}<b>{{ end }}{{ text }}")));

        Assert.Contains("page.html(2,", fault.Message, StringComparison.Ordinal);
        Assert.Contains("capture is not allowed", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_template_that_does_not_parse_names_its_place()
    {
        var fault = Assert.Throws<InvalidOperationException>(() => Render(("page.html", "\n{{ for x in }}")));

        Assert.Contains("page.html(2,", fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_value_is_encoded_once_however_deep_it_is_included() =>
        Assert.Equal(
            "<i>&lt;b&gt; &amp; &quot;</i>",
            new TemplateSet(name => name switch
            {
                "outer" => "{{ include 'middle' }}",
                "middle" => "<i>{{ include 'inner' page }}</i>",
                _ => "{{ $1 }}",
            }).Render("outer", "<b> & \""));

    [Fact]
    public void A_loop_longer_than_a_thousand_goes_to_its_end() =>
        Assert.Equal(5000, Render(("page.html", "{{ for i in 1..5000 }}x{{ end }}")).Length);

    private static string Render(params (string Name, string Text)[] templates) =>
        new TemplateSet(name => templates.Single(template => template.Name == name).Text).Render("page.html", new { known = 1 });
}
