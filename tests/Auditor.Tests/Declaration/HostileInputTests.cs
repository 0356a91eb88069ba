using System.Diagnostics;
using System.Globalization;
using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

/// <summary>Input that is broken or meant to break the reader.</summary>
public sealed class HostileInputTests
{
    public static readonly TheoryData<string, string[]> Broken = new()
    {
        { "", ["1: the file is empty"] },
        { "\uFEFF# nothing\n", ["1: the file is empty"] },
        { "--- \n", ["1: the file is empty"] },
        { "- a", ["1: declaration: expected a map with the keys audit, model, data, response, final_model, left_out, elimination, reported, found a list"] },
        { "audit: 1\nmodel: a\0b\n", ["2: the control character U+0000 cannot stand in YAML"] },
        { "audit: 1\r\nmodel: a\u0007b\r\n", ["2: the control character U+0007 cannot stand in YAML"] },
        { Declared.With("response: \"a\\0b\""), ["4: a control character cannot stand in a text"] },
        { "audit: 1\n\tmodel: {id: a}\n", ["2: a tab cannot indent YAML; use spaces"] },
        { "audit: 1\nmodel:\n  id: a\n\tversion: 2\n", ["4: a tab cannot indent YAML; use spaces"] },
        { Declared.With("left_out:\n\t- group: a"), ["7: a tab cannot indent YAML; use spaces"] },
        { Declared.With("\tleft_out: []"), ["6: a tab cannot indent YAML; use spaces"] },
        { Declared.With("data: {source: leases.csv"), ["3: the bracket that opens in column 7 is not closed, or what stands in it is not YAML"] },
        { Declared.With("final_model:\n  terms: [a, b\nleft_out: []"), ["6: the bracket that opens in column 10 is not closed, or what stands in it is not YAML"] },
        { Declared.With("final_model: {terms: [a, , b]}"), ["5: the bracket that opens in column 22 is not closed, or what stands in it is not YAML"] },
        { Declared.With("response: ]"), ["4: this is not YAML: While parsing a node, did not find expected node content."] },
        { Declared.With("response: \"loss"), ["4: this is not YAML: the quotation mark is not closed"] },
        { Declared.With("response: 'loss"), ["4: this is not YAML: the quotation mark is not closed"] },
        { Declared.With("data: {source: \"leases\\q\"}"), ["3: this is not YAML: a backslash in double quotation marks must be written twice"] },
        { Declared.With("response: @loss"), ["4: this is not YAML: text cannot start with this character; put it in quotation marks"] },
        { Declared.With("response: loss: rate"), ["4: this is not YAML: a second colon on a line, or a deeper line under a key that already has a value; put text with a colon in quotation marks"] },
        { Declared.With("model:\n    id: a\n  title: b"), ["4: this is not YAML: expected a key, or '-' and a space; is the indentation the same as above?"] },
        { Declared.With("final_model:\n  terms:\n  - a\n  -b\n  - c"), ["8: this is not YAML: expected a key, or '-' and a space; is the indentation the same as above?"] },
        { "- a\n-b\n- c\n", ["2: this is not YAML: expected a key, or '-' and a space; is the indentation the same as above?"] },
        { Declared.With("model: {id: x, id: y, id: z}"), ["2: the key 'id' stands twice, first on line 2", "2: the key 'id' stands twice, first on line 2"] },
        { Declared.With("? [a]\n: b"), ["6: expected a text as a key, found a list"] },
        { Declared.With("...\nmore: 1"), ["7: a second document starts here; expected one document a file"] },
        { Declared.With("response: !!str loss"), ["4: a tag has no meaning here; leave out what starts with '!', or put it in quotation marks"] },
        { Declared.With("model: {id: a, <<: {title: b}}"), ["2: merging with '<<' is not supported; write the keys out"] },
        { Declared.With("final_model: {terms: &t [a, {product: *t}]}"), ["5: the anchor '&t' contains itself", "5: final_model.terms, product: expected a list of terms, found '*t'"] },
        { Declared.With("response: *loss"), ["4: the alias '*loss' has no anchor before it"] },
        { Declared.With("response: " + Repeat("{log: ", 100_000)), ["4: nested more than 64 levels deep"] },
        { Repeat("[", 100_000), ["1: nested more than 64 levels deep"] },
        { Repeat("- ", 100_000), ["1: nested more than 64 levels deep"] },
        { Repeat("? ", 100_000), ["1: nested more than 64 levels deep"] },
        { Declared.With("left_out: " + Doubling(6, 20)), ["6: more than 100000 values, aliases written out"] },
        { Declared.With("left_out: " + Doubling(30, 2)), ["6: more than 100000 values, aliases written out"] },
        { "audit: " + Repeat("1", 5_000_000), [": the file is longer than 4000000 characters"] },
    };

    [Theory]
    [MemberData(nameof(Broken))]
    public void Broken_input_is_a_problem_in_plain_words(string yaml, string[] problems)
    {
        var reading = DeclarationReader.Read(yaml, "x.yaml");

        Assert.Null(reading.Declaration);
        Assert.Equal(problems, reading.Problems.Select(problem => $"{problem.Line}: {problem.Message}"));
    }

    [Fact]
    public void A_list_can_be_named_and_used_again()
    {
        var declaration = Declared.Good("final_model: {terms: [a, {product: &pair [a, b]}]}", "left_out: [{group: g, terms: [b, {log: {product: *pair}}]}]");

        Assert.Equal("log(a * b)", declaration.LeftOut[0].Terms[1].Label);
    }

    [Fact]
    public void Nesting_is_refused_also_when_aliases_make_it()
    {
        var levels = string.Join(", ", Enumerable.Range(1, 40).Select(level => string.Create(
            CultureInfo.InvariantCulture, $"&n{level} {{log: {{log: {(level == 1 ? "x" : "*n" + (level - 1).ToString(CultureInfo.InvariantCulture))}}}}}")));

        Assert.Equal(["5: nested more than 64 levels deep"], Declared.Problems("final_model: {terms: [" + levels + "]}"));
    }

    [Fact]
    public void The_deepest_term_that_fits_is_read()
    {
        var term = Repeat("{log: ", 60) + "x" + Repeat("}", 60);

        Assert.Equal(Repeat("log(", 60) + "x" + Repeat(")", 60), Declared.Term(term).Label);
    }

    [Fact]
    public void A_message_shows_only_the_start_of_a_long_text()
    {
        var problem = Assert.Single(Declared.Problems("audit: " + Repeat("9", 1_000_000)));

        Assert.Equal("1: audit: expected 1, the only version of this format, found '" + Repeat("9", 60) + "…'", problem);
    }

    /// <summary>Time in the input's size, not in its square: a minute would do for neither.</summary>
    [Fact]
    public void A_large_declaration_is_read_in_seconds()
    {
        var terms = string.Join(", ", Enumerable.Range(0, 30_000).Select(number => string.Create(CultureInfo.InvariantCulture, $"{{log: x{number}}}")));
        var clock = Stopwatch.StartNew();

        var declaration = Declared.Good("left_out: [{group: many, terms: [" + terms + "]}]");

        Assert.Equal(30_000, declaration.LeftOut[0].Terms.Count);
        Assert.InRange(clock.Elapsed.TotalSeconds, 0, 30);
    }

    private static string Repeat(string text, int times) => string.Concat(Enumerable.Repeat(text, times));

    /// <summary>Anchors each of which repeats the one before so many times.</summary>
    private static string Doubling(int levels, int times) => "[" + string.Join(", ", Enumerable.Range(0, levels).Select(level =>
        string.Create(CultureInfo.InvariantCulture, $"&a{level} [") + Repeat(level == 0 ? "x, " : string.Create(CultureInfo.InvariantCulture, $"*a{level - 1}, "), times) + "]")) + "]";
}
