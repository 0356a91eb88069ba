namespace Auditor.Tests.Declaration;

/// <summary>What is said about the key data, word by word. Each case puts one key of the least declaration in another way.</summary>
public sealed class DataProblemTests
{
    public static readonly TheoryData<string[], string[]> Cases = new()
    {
        {
            ["data: leases.csv"],
            [
                "3: data: expected a map with the keys source, sha256, columns, missing, keep, row_label, time, period, unit, serial_lag, split, cluster, weights, segments, found 'leases.csv'",
            ]
        },
        {
            ["data: {}"],
            [
                "3: data: 'source' is missing; expected a file, a list of files or a folder",
            ]
        },
        {
            ["data: {source: }"],
            [
                "3: data.source: expected a file, a list of files or a folder, found nothing",
            ]
        },
        {
            ["data: {source: []}"],
            [
                "3: data.source: expected a list of files, found an empty one",
            ]
        },
        {
            ["data: {source: [a.csv, b.csv, a.csv, [c]]}"],
            [
                "3: data.source: the file 'a.csv' stands twice, first on line 3",
                "3: data.source: expected a file, found a list",
            ]
        },
        {
            ["data: {source: a.csv, sha256: abc}"],
            [
                "3: data.sha256: expected 64 hexadecimal digits, found 'abc'",
            ]
        },
        {
            ["data: {source: a.csv, colums: {a: {kind: date}}}"],
            [
                "3: data: unknown key 'colums'; did you mean 'columns'?",
            ]
        },
        {
            ["data: {source: a.csv, columns: [a]}"],
            [
                "3: data.columns: expected a map from column names to kinds, found a list",
            ]
        },
        {
            ["data: {source: a.csv, columns: {a: number}}"],
            [
                "3: data.columns.a: expected a map with the keys kind, reference, levels, found 'number'",
            ]
        },
        {
            ["data: {source: a.csv, columns: {a: {kind: nubmer}, b: {kind: factor}, intercept: {kind: date}, c: {}}}"],
            [
                "3: data.columns.a.kind: expected number, levels, date or text, found 'nubmer'; did you mean 'number'?",
                "3: data.columns.b.kind: expected number, levels, date or text, found 'factor'",
                "3: data.columns: a column cannot be named 'intercept', which is the label of the constant; rename it in the data",
                "3: data.columns.c: expected kind, reference or levels, found none",
            ]
        },
        {
            ["data: {source: a.csv, columns: {a: {kind: number, reference: x, levels: [x]}}}"],
            [
                "3: data.columns.a.reference: belongs to a column of kind levels only",
                "3: data.columns.a.levels: belongs to a column of kind levels only",
            ]
        },
        {
            ["data: {source: a.csv, columns: {a: {reference: nort, levels: [north, south, north]}, b: {levels: []}, c: {levels: x}}}"],
            [
                "3: data.columns.a.levels: the level 'north' stands twice, first on line 3",
                "3: data.columns.a.reference: 'nort' is not one of the levels; did you mean 'north'?",
                "3: data.columns.b.levels: expected a list of levels, found an empty one",
                "3: data.columns.c.levels: expected a list of levels, found 'x'",
            ]
        },
        {
            ["data: {source: a.csv, missing: }"],
            [
                "3: data.missing: expected a list of texts, found nothing",
            ]
        },
        {
            ["data: {source: a.csv, missing: NA}"],
            [
                "3: data.missing: expected a list of texts, found 'NA'",
            ]
        },
        {
            ["data: {source: a.csv, missing: [\"\", NA, \"\", [x]]}"],
            [
                "3: data.missing: the text '' stands twice, first on line 3",
                "3: data.missing: expected a text, found a list",
            ]
        },
        {
            ["data: {source: a.csv, keep: {column: a}}"],
            [
                "3: data.keep: expected a list of conditions, found a map",
            ]
        },
        {
            ["data: {source: a.csv, keep: [a, {column: a}, {equals: 3}, {column: a, equals: 1, not: 2}, {column: a, in: []}, {column: a, in: x}, {column: a, present: false}]}"],
            [
                "3: data.keep: expected a map with the keys column, equals, not, in, from, to, present, found 'a'",
                "3: data.keep: expected exactly one of equals, not, in, from/to or present, found none",
                "3: data.keep: 'column' is missing; expected a column name",
                "3: data.keep: expected exactly one of equals, not, in, from/to or present, found equals, not",
                "3: data.keep.in: expected a list of texts, found an empty one",
                "3: data.keep.in: expected a list of texts, found 'x'",
                "3: data.keep.present: expected true, found 'false'",
            ]
        },
        {
            ["data: {source: a.csv, keep: [{column: a, from: x}, {column: a, from: 2020-13-01}, {column: a, from: 3, to: 2}, {column: a, from: 3, to: 2020-01-01}, {column: a, form: 3}]}"],
            [
                "3: data.keep.from: expected a date as YYYY-MM-DD or a number, found 'x'",
                "3: data.keep.from: expected a date as YYYY-MM-DD or a number, found '2020-13-01'",
                "3: data.keep: expected two dates or two numbers, 'from' not after 'to', found '3' and '2'",
                "3: data.keep: expected two dates or two numbers, 'from' not after 'to', found '3' and '2020-01-01'",
                "3: data.keep: unknown key 'form'; did you mean 'from'?",
            ]
        },
        {
            ["data: {source: a.csv, time: {file_order: false}, period: month, serial_lag: -1}"],
            [
                "3: data.time.file_order: expected true, found 'false'",
                "3: data.serial_lag: expected a whole number from 0 to 1000000, found '-1'",
            ]
        },
        {
            ["data: {source: a.csv, time: {file_order: true}, period: month, serial_lag: 0}"],
            [
                "3: data.period: needs a date column under data.time; the file's own order has no periods",
            ]
        },
        {
            ["data: {source: a.csv, time: {file: true}}"],
            [
                "3: data.time: unknown key 'file'; the only key is file_order",
                "3: data.time: 'file_order' is missing; expected a column name or {file_order: true}",
            ]
        },
        {
            ["data: {source: a.csv, period: months, serial_lag: 2.5}"],
            [
                "3: data.period: expected day, week, month, quarter or year, found 'months'; did you mean 'month'?",
                "3: data.serial_lag: expected a whole number from 0 to 1000000, found '2.5'",
                "3: data.period: needs data.time, the order of the rows",
                "3: data.serial_lag: needs data.time, the order of the rows",
            ]
        },
        {
            ["data: {source: a.csv, split: {column: a}}"],
            [
                "3: data.split: expected column and at, or row (to divide the rows by each value of a column, use data.segments), found column",
            ]
        },
        {
            ["data: {source: a.csv, split: {column: a, at: x}}"],
            [
                "3: data.split.at: expected a date as YYYY-MM-DD or a number (to divide the rows by each value of a column, use data.segments), found 'x'",
            ]
        },
        {
            ["data: {source: a.csv, split: {row: 0}}"],
            [
                "3: data.split.row: expected a whole number from 1 to 2147483647, found '0'",
            ]
        },
        {
            ["data: {source: a.csv, split: {row: 5, column: a, at: 3}}"],
            [
                "3: data.split: expected column and at, or row, found column, at, row",
            ]
        },
        {
            ["data: {source: a.csv, weights: {column: w}}"],
            [
                "3: data.weights: 'kind' is missing; expected precision, frequency or sampling, which lead to different formulas",
            ]
        },
        {
            ["data: {source: a.csv, weights: w}"],
            [
                "3: data.weights: expected a map with the keys column, kind, found 'w'",
            ]
        },
        {
            ["data: {source: a.csv, weights: {column: w, kind: freqency}}"],
            [
                "3: data.weights.kind: expected precision, frequency or sampling, found 'freqency'; did you mean 'frequency'?",
            ]
        },
        {
            ["data: {source: a.csv, weights: {kind: sampling}}"],
            [
                "3: data.weights: 'column' is missing; expected a column name",
            ]
        },
        {
            ["data: {source: a.csv, segments: [a, b, a]}"],
            [
                "3: data.segments: the column 'a' stands twice, first on line 3",
            ]
        },
        {
            ["data: {source: a.csv, segments: {a: b}}"],
            [
                "3: data.segments: expected a list of column names, found a map",
            ]
        },
        {
            ["data: {source: a.csv, cluster: [a]}"],
            [
                "3: data.cluster: expected a column name, found a list",
            ]
        },
        {
            ["data: {source: a.csv, row_label: intercept}"],
            [
                "3: data.row_label: a column cannot be named 'intercept', which is the label of the constant; rename it in the data",
            ]
        },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_problem_is_named_with_its_line(string[] declared, string[] problems) =>
        Assert.Equal(problems, Declared.Problems(declared));
}
