using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

public sealed class MentionTests
{
    [Fact]
    public void Every_column_is_named_with_its_line_and_place() => Assert.Equal(
        [
            "11 region data.columns", "12 grade data.columns", "13 opened data.columns", "14 2008 data.columns", "15 remark data.columns",
            "18 status data.keep", "19 source data.keep", "20 grade data.keep", "21 opened data.keep", "22 price data.keep",
            "23 lease_no data.row_label", "24 opened data.time", "26 dealer data.unit", "28 opened data.split", "29 dealer_group data.cluster",
            "30 exposure data.weights", "31 region data.segments", "31 grade data.segments",
            "32 loss_rate response",
            "36 advance_rate final_model.terms", "37 price final_model.terms", "38 price final_model.terms", "39 region final_model.terms",
            "40 advance_rate final_model.terms", "40 region final_model.terms", "41 age final_model.terms", "42 hours final_model.terms",
            "43 weight final_model.terms", "44 age final_model.terms", "45 grade final_model.terms", "46 opened final_model.terms", "47 opened final_model.terms",
            "50 engine_hours left_out \"engine condition\"", "50 engine_hours left_out \"engine condition\"",
            "55 opened left_out \"calendar\"", "56 opened left_out \"calendar\"",
            "58 balance left_out \"money\"", "58 price left_out \"money\"", "58 balance left_out \"money\"", "58 price left_out \"money\"",
            "58 2008 left_out \"money\"", "58 NO left_out \"money\"",
            "60 price left_out \"tails\"", "60 price left_out \"tails\"", "63 price left_out \"past\"", "64 price left_out \"past\"",
        ],
        Mentions(DeclarationReader.Read(FullDeclaration.Yaml, "full.yaml")));

    [Fact]
    public void They_are_there_although_something_else_is_wrong()
    {
        var reading = Declared.Read(
            "data: {source: [a.csv, b.csv], surce: x, keep: [{column: status, equal: 1}], weights: {column: w}, split: {column: t, row: 3}}",
            "response: {lgo: loss}",
            "final_model: {intercept: maybe, terms: [{product: [a, {foo: b}]}, {power: {of: c, exponent: x}}]}",
            "left_out: [{group: g, terms: [d, {log: {}}]}]");

        Assert.Null(reading.Declaration);
        Assert.Equal(["a.csv", "b.csv"], reading.Sources);
        Assert.Equal(
            ["3 status data.keep", "3 w data.weights", "3 t data.split", "5 a final_model.terms", "5 c final_model.terms", "6 d left_out \"g\""],
            Mentions(reading));
    }

    private static IEnumerable<string> Mentions(DeclarationReading reading) =>
        reading.Mentions.Select(mention => $"{mention.Line} {mention.Column} {mention.Where}");
}
