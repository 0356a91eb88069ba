namespace Auditor.Tests.Declaration;

/// <summary>What is said about response and terms, word by word. Each case puts one key of the least declaration in another way.</summary>
public sealed class TermProblemTests
{
    public static readonly TheoryData<string[], string[]> Cases = new()
    {
        {
            ["response: {polynomial: {of: a, degree: 2}}"],
            [
                "4: response: the response needs a term that yields one number; 'polynomial(a, 2)' yields several columns",
            ]
        },
        {
            ["response: {log: {season: {of: a, by: month}}}"],
            [
                "4: response, log: log needs a term that yields one number; 'month(a)' yields several columns",
            ]
        },
        {
            ["response: [a]"],
            [
                "4: response: expected a column name or one term such as {log: price}, found a list",
            ]
        },
        {
            ["response: price"],
            [
                "5: final_model.terms: the term 'price' is the response on line 4",
            ]
        },
        {
            ["final_model: {}"],
            [
                "5: final_model: 'terms' is missing; expected a list of terms, which may be empty when there is an intercept",
            ]
        },
        {
            ["final_model: {terms: price}"],
            [
                "5: final_model.terms: expected a list of terms, found 'price'",
            ]
        },
        {
            ["final_model: {intercept: no, terms: [price]}"],
            [
                "5: final_model.intercept: expected true or false, found 'no'",
            ]
        },
        {
            ["final_model: {intercept: false, terms: []}"],
            [
                "5: final_model: a model without an intercept needs at least one term",
            ]
        },
        {
            ["final_model: {intercept: false, terms: }"],
            [
                "5: final_model: a model without an intercept needs at least one term",
            ]
        },
        {
            ["final_model: {terms: [a, b, a, {product: [a, b]}, {product: [b, a]}, {square: a}, {power: {of: a, exponent: 2}}]}"],
            [
                "5: final_model.terms: the term 'a' stands twice, first on line 5",
                "5: final_model.terms: the term 'b * a' stands twice, first as 'a * b' on line 5",
                "5: final_model.terms: the term 'a^2' stands twice, first on line 5",
            ]
        },
        {
            ["final_model: {terms: [loss]}"],
            [
                "5: final_model.terms: the term 'loss' is the response on line 4",
            ]
        },
        {
            ["final_model: {terms: [{}, {log: a, exp: b}, {lgo: a}, {foo: a}, {log:price}]}"],
            [
                "5: final_model.terms: expected a column name or one term such as {log: price}, found an empty map",
                "5: final_model.terms: expected a column name or one term such as {log: price}, found a map with the keys log, exp",
                "5: final_model.terms: unknown term 'lgo'; did you mean 'log'?",
                "5: final_model.terms: unknown term 'foo'; the terms are log, log10, log1p, sqrt, square, inverse, exp, abs, center, power, ratio, minus, winsorise, cap, product, polynomial, spline, bins, indicator, step, pulse, season, trend, lag, change, moving_average",
                "5: final_model.terms: unknown term 'log:price'; the terms are log, log10, log1p, sqrt, square, inverse, exp, abs, center, power, ratio, minus, winsorise, cap, product, polynomial, spline, bins, indicator, step, pulse, season, trend, lag, change, moving_average",
            ]
        },
        {
            ["final_model: {terms: [{log: [a]}, {log: {of: a, plus: x}}, {log: {of: a, minus: 1}}, {log: {plus: 1}}, {log: {}}, {center: {of: a, plus: 1}}, {log: }]}"],
            [
                "5: final_model.terms, log: expected a column name or one term such as {log: price}, found a list",
                "5: final_model.terms, log.plus: expected a number, found 'x'",
                "5: final_model.terms, log: unknown key 'minus'; the keys are of, plus",
                "5: final_model.terms, log: 'of' is missing; expected a column or a term that yields one number",
                "5: final_model.terms, log: 'of' is missing; expected a column or a term that yields one number",
                "5: final_model.terms, center: unknown key 'plus'; the only key is of",
                "5: final_model.terms, log: expected a column name, found nothing",
            ]
        },
        {
            ["final_model: {terms: [{power: a}, {power: {of: a}}, {power: {of: a, exponent: 0}}, {power: {of: a, exponent: 1e400}}, {power: {of: a, exponent: .inf}}, {power: {exponent: 2}}]}"],
            [
                "5: final_model.terms, power: expected a map with the keys of, exponent, found 'a'",
                "5: final_model.terms, power: 'exponent' is missing; expected a number other than 0",
                "5: final_model.terms, power.exponent: expected a number other than 0, found '0'",
                "5: final_model.terms, power.exponent: expected a number other than 0, found '1e400'",
                "5: final_model.terms, power.exponent: expected a number other than 0, found '.inf'",
                "5: final_model.terms, power: 'of' is missing; expected a column or a term that yields one number",
            ]
        },
        {
            ["final_model: {terms: [{polynomial: {of: a, degree: 0}}, {polynomial: {of: b, degree: 2.5}}, {polynomial: {of: a, degre: 2}}, {polynomial: {of: a, degree: 31}}]}"],
            [
                "5: final_model.terms, polynomial.degree: expected a whole number from 1 to 30, found '0'",
                "5: final_model.terms, polynomial.degree: expected a whole number from 1 to 30, found '2.5'",
                "5: final_model.terms, polynomial: unknown key 'degre'; did you mean 'degree'?",
                "5: final_model.terms, polynomial.degree: expected a whole number from 1 to 30, found '31'",
            ]
        },
        {
            ["final_model: {terms: [{spline: {of: a, knots: [1, 2]}}, {spline: {of: a, knots: [1, 2, 2]}}, {spline: {of: a, knots: [1, x, 3]}}, {spline: {of: a, knots: 3}}, {bins: {of: a, cuts: []}}, {bins: {of: a, cuts: [2, 1]}}]}"],
            [
                "5: final_model.terms, spline.knots: expected a list of at least 3 numbers, found 2",
                "5: final_model.terms, spline.knots: expected numbers in rising order, none twice",
                "5: final_model.terms, spline.knots: expected a number, found 'x'",
                "5: final_model.terms, spline.knots: expected a list of numbers, found '3'",
                "5: final_model.terms, bins.cuts: expected a list of numbers, found an empty one",
                "5: final_model.terms, bins.cuts: expected numbers in rising order, none twice",
            ]
        },
        {
            ["final_model: {terms: [{indicator: {of: {log: a}, equals: 1}}, {indicator: {of: a}}, {indicator: {of: a, equals: [1]}}]}"],
            [
                "5: final_model.terms, indicator.of: expected a column name, found a map",
                "5: final_model.terms, indicator: 'equals' is missing; expected a text or number",
                "5: final_model.terms, indicator.equals: expected a text, found a list",
            ]
        },
        {
            ["final_model: {terms: [{step: {of: a, from: 2020-02-30}}, {step: {of: a}}, {pulse: {of: a, from: 3, to: 2}}, {pulse: {of: a, from: 3}}, {season: {of: a, by: week}}, {trend: {of: a}}]}"],
            [
                "5: final_model.terms, step.from: expected a date as YYYY-MM-DD or a number, found '2020-02-30'",
                "5: final_model.terms, step: 'from' is missing; expected a date as YYYY-MM-DD or a number",
                "5: final_model.terms, pulse: expected two dates or two numbers, 'from' not after 'to', found '3' and '2'",
                "5: final_model.terms, pulse: 'to' is missing; expected a date as YYYY-MM-DD or a number",
                "5: final_model.terms, season.by: expected quarter or month, found 'week'",
                "5: final_model.terms, trend: expected a column name, found a map",
            ]
        },
        {
            ["final_model: {terms: [{ratio: [a]}, {minus: [a, b, c]}, {ratio: a}, {minus: [a, {spline: {of: b, knots: [1, 2, 3]}}]}, {product: [a]}, {product: a}, {product: [a, {foo: b}]}]}"],
            [
                "5: final_model.terms, ratio: expected a list of two terms, found 1",
                "5: final_model.terms, minus: expected a list of two terms, found 3",
                "5: final_model.terms, ratio: expected a list of two terms, found 'a'",
                "5: final_model.terms, minus: minus needs a term that yields one number; 'b spline' yields several columns",
                "5: final_model.terms, product: expected a list of at least 2 terms, found 1",
                "5: final_model.terms, product: expected a list of terms, found 'a'",
                "5: final_model.terms, product: unknown term 'foo'; the terms are log, log10, log1p, sqrt, square, inverse, exp, abs, center, power, ratio, minus, winsorise, cap, product, polynomial, spline, bins, indicator, step, pulse, season, trend, lag, change, moving_average",
            ]
        },
        {
            ["final_model: {terms: [{winsorise: {of: a, lower: 0.5, upper: 0.5}}, {winsorise: {of: a, lower: -0.1, upper: 1.1}}, {winsorise: {of: a, lower: 0.1}}, {cap: {of: a}}, {cap: {of: a, lower: 2, upper: 1}}, {cap: a}]}"],
            [
                "5: final_model.terms, winsorise: expected lower below upper, found 0.5 and 0.5",
                "5: final_model.terms, winsorise.lower: expected a quantile from 0 to 1, found '-0.1'",
                "5: final_model.terms, winsorise.upper: expected a quantile from 0 to 1, found '1.1'",
                "5: final_model.terms, winsorise: 'upper' is missing; expected a quantile from 0 to 1",
                "5: final_model.terms, cap: expected lower, upper or both",
                "5: final_model.terms, cap: expected lower below upper, found 2 and 1",
                "5: final_model.terms, cap: expected a map with the keys of, lower, upper, found 'a'",
            ]
        },
        {
            ["final_model: {terms: [{lag: {of: a, by: 1}}, {change: {of: {lag: {of: b, by: 1}}, by: 2}}]}"],
            [
                "5: lag needs data.time, the order of the rows",
                "5: change needs data.time, the order of the rows",
                "5: lag needs data.time, the order of the rows",
            ]
        },
        {
            ["final_model: {terms: [{lag: {of: a, by: 0}}, {lag: a}, {moving_average: {of: a, over: 1}}, {change: {of: {bins: {of: a, cuts: [1]}}, by: 1}}]}", "data: {source: a.csv, time: t}"],
            [
                "5: final_model.terms, lag.by: expected a whole number from 1 to 1000000, found '0'",
                "5: final_model.terms, lag: expected a map with the keys of, by, found 'a'",
                "5: final_model.terms, moving_average.over: expected a whole number from 2 to 1000000, found '1'",
                "5: final_model.terms, change.of: change needs a term that yields one number; 'a bins' yields several columns",
            ]
        },
        {
            ["final_model: {terms: [{log: {product: [a, b]}}, {log: {product: [a, {polynomial: {of: b, degree: 2}}]}}]}"],
            [
                "5: final_model.terms, log: log needs a term that yields one number; 'a * polynomial(b, 2)' yields several columns",
            ]
        },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_problem_is_named_with_its_line(string[] declared, string[] problems) =>
        Assert.Equal(problems, Declared.Problems(declared));
}
