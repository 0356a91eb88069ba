namespace Auditor.Tests.Declaration;

/// <summary>What is said about left-out groups, the elimination path and reported figures, word by word. Each case puts one key of the least declaration in another way.</summary>
public sealed class GroupProblemTests
{
    public static readonly TheoryData<string[], string[]> Cases = new()
    {
        {
            ["left_out: {}"],
            [
                "6: left_out: expected a list of groups, found a map",
            ]
        },
        {
            ["left_out: x"],
            [
                "6: left_out: expected a list of groups, found 'x'",
            ]
        },
        {
            ["left_out: [x, {group: a}, {terms: [b]}, {group: c, terms: []}, {group: \"\", terms: [d]}, {group: e, terms: [f], becuase: x}]"],
            [
                "6: left_out, group 1: expected a map with the keys group, terms, because, reported, found 'x'",
                "6: left_out \"a\": 'terms' is missing; expected a list of terms",
                "6: left_out, group 3: 'group' is missing; expected the name of the group",
                "6: left_out \"c\".terms: expected a list of terms, found an empty one",
                "6: left_out, group 5.group: expected the name of the group, found an empty text",
                "6: left_out \"e\": unknown key 'becuase'; did you mean 'because'?",
            ]
        },
        {
            ["left_out: [{group: a, terms: [b]}, {group: c, terms: [b, price, d, d, loss]}, {group: a, terms: [e]}]"],
            [
                "6: left_out: the group 'a' stands twice, first on line 6",
                "6: left_out \"c\": the term 'b' is also in left_out \"a\" on line 6",
                "6: left_out \"c\": the term 'price' is also in final_model.terms on line 5",
                "6: left_out \"c\": the term 'd' stands twice, first on line 6",
                "6: left_out \"c\": the term 'loss' is the response on line 4",
            ]
        },
        {
            ["left_out: [{group: a, terms: [b], reported: {}}, {group: c, terms: [d], reported: {f: x, df: [1, 2, 3], p: 0.4.1}}, {group: e, terms: [f], reported: {df: 3, q: 1}}]"],
            [
                "6: left_out \"a\".reported: expected at least one of f, df, p",
                "6: left_out \"c\".reported.f: expected a figure such as 2.13, 1e-05 or \"> 100\", without thousands marks or a per cent sign, found 'x'",
                "6: left_out \"c\".reported.df: expected a list of one or two figures, found 3",
                "6: left_out \"c\".reported.p: expected a figure such as 0.310, 41.3 %, 1e-05 or \"< 0.001\", without thousands marks, found '0.4.1'",
                "6: left_out \"e\".reported: unknown key 'q'; the keys are f, df, p",
                "6: left_out \"e\".reported.df: expected a list of one or two figures, found '3'",
            ]
        },
        {
            ["left_out: [{group: a, terms: [b], because: \"\", reported: {f: 1, df: [2, 480], p: \"< 0.001\"}}]"],
            [
                "6: left_out \"a\".because: expected a text, found an empty text",
            ]
        },
        {
            ["elimination: {}"],
            [
                "6: elimination: 'rule' is missing; expected one of drop_above, drop_worse or judgement",
            ]
        },
        {
            ["elimination: {rule: {}}"],
            [
                "6: elimination.rule: expected exactly one of drop_above, drop_worse or judgement, found none",
            ]
        },
        {
            ["elimination: {rule: {drop_above: 5}}"],
            [
                "6: elimination.rule.drop_above: expected a p between 0 and 1, found '5'",
            ]
        },
        {
            ["elimination: {rule: {drop_above: 0.05, drop_worse: aic}}"],
            [
                "6: elimination.rule: expected exactly one of drop_above, drop_worse or judgement, found drop_above, drop_worse",
            ]
        },
        {
            ["elimination: {rule: {drop_worse: aicc}}"],
            [
                "6: elimination.rule.drop_worse: expected aic or bic, found 'aicc'; did you mean 'aic'?",
            ]
        },
        {
            ["elimination: {rule: {judgement: }}"],
            [
                "6: elimination.rule.judgement: expected a text, found nothing",
            ]
        },
        {
            ["elimination: {rule: {drop_abov: 0.1}, by: groups, forced: [prise, price, price, {foo: 1}], steps: [{drop: engine}, {drop: engin}, {drop: engine}, {drp: x}, {drop: zzz}]}", "left_out: [{group: engine, terms: [b]}]"],
            [
                "6: elimination.rule: unknown key 'drop_abov'; did you mean 'drop_above'?",
                "6: elimination.by: expected group or term, found 'groups'; did you mean 'group'?",
                "6: elimination.forced: the term 'prise' is not in final_model.terms; did you mean 'price'?",
                "6: elimination.forced: the term 'price' stands twice, first on line 6",
                "6: elimination.forced: unknown term 'foo'; the terms are log, log10, log1p, sqrt, square, inverse, exp, abs, center, power, ratio, minus, winsorise, cap, product, polynomial, spline, bins, indicator, step, pulse, season, trend, lag, change, moving_average",
                "6: elimination.steps.drop: no left-out group is called 'engin'; did you mean 'engine'?",
                "6: elimination.steps.drop: the group 'engine' stands twice, first on line 6",
                "6: elimination.steps: unknown key 'drp'; did you mean 'drop'?",
                "6: elimination.steps.drop: no left-out group is called 'zzz'; known: engine",
            ]
        },
        {
            ["reported: {}"],
            [
                "6: reported: expected at least one of rows_used, r_squared, adjusted_r_squared, residual_sd, f, coefficients",
            ]
        },
        {
            ["reported: {r2: 0.4}"],
            [
                "6: reported: unknown key 'r2'; the keys are rows_used, r_squared, adjusted_r_squared, residual_sd, f, coefficients",
            ]
        },
        {
            ["reported: {rows_used: many, coefficients: [a]}"],
            [
                "6: reported.rows_used: expected a whole number such as 54000, without thousands marks, found 'many'",
                "6: reported.coefficients: expected a map from coefficient labels to figures, found a list",
            ]
        },
        {
            ["reported: {coefficients: {a: {}, b: {estimat: 1}, c: 3, d: {estimate: \"1,000.5\", p: \"<0.001\"}}}"],
            [
                "6: reported.coefficients[a]: expected at least one of estimate, standard_error, p",
                "6: reported.coefficients[b]: unknown key 'estimat'; did you mean 'estimate'?",
                "6: reported.coefficients[c]: expected a map with the keys estimate, standard_error, p, found '3'",
                "6: reported.coefficients[d].estimate: expected a figure such as 0.310, 41.3 %, 1e-05 or \"< 0.001\", without thousands marks, found '1,000.5'",
            ]
        },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_problem_is_named_with_its_line(string[] declared, string[] problems) =>
        Assert.Equal(problems, Declared.Problems(declared));
}
