using Auditor.Data;
using Auditor.Declaration;
using Auditor.Yaml;

namespace Auditor.Design;

/// <summary>Binds columns as they are, and indicators.</summary>
internal static class ColumnBinding
{
    public static BoundTerm? Column(BindingScope scope, ColumnTerm term) => scope[term] switch
    {
        NumberColumn numbers => new BoundNumber(term, numbers),
        LevelsColumn levels => Levels(scope, term, levels),
        DateColumn => scope.Refuse(term, $"{term.Column} holds dates and is no number: use step, pulse, season or trend of it"),
        _ => scope.Refuse(term, $"{term.Column} is text: declare it with kind: levels or kind: number to use it as a term"),
    };

    /// <summary>A number is compared as a number, a date as a day, anything else as the text it is.</summary>
    public static BoundTerm? Indicator(BindingScope scope, IndicatorTerm term)
    {
        var column = scope[term.Of];
        if (Fault(scope, term, column) is { } fault)
        {
            return scope.Refuse(term, $"{term.Label}: {fault}");
        }

        if (column is LevelsColumn levels && scope.Coding(levels, term) is null)
        {
            return null;
        }

        var equals = CellTest.Equal(column, term.EqualTo);
        if (!scope.KeptRows.Any(equals))
        {
            scope.Note(new ValueWithoutRows(column.Name, term.EqualTo));
        }

        return new BoundCell(term, column, row => equals(row) ? 1 : 0);
    }

    private static BoundDummies? Levels(BindingScope scope, ColumnTerm term, LevelsColumn column)
    {
        if (scope.Coding(column, term) is not { } coding)
        {
            return null;
        }

        foreach (var note in coding.Notes)
        {
            scope.Note(note);
        }

        var columnOfCode = coding.ColumnOfCode(column);
        IReadOnlyList<string> labels = [.. coding.Levels.Skip(1).Select(level => $"{term.Column} = {level}")];
        return new BoundDummies(term, column, labels, row => column.Codes[row] < 0 ? -1 : columnOfCode[column.Codes[row]]);
    }

    private static string? Fault(BindingScope scope, IndicatorTerm term, DataColumn column)
    {
        IReadOnlyList<string>? known = column switch
        {
            LevelsColumn levels => scope.Coding(levels, term)?.Known,
            TextColumn text => [.. scope.KeptRows.Select(text.Text).OfType<string>().Distinct(StringComparer.Ordinal)],
            _ => null,
        };
        return known is null || known.Contains(term.EqualTo)
            ? CellTest.Fault(column, term.EqualTo)
            : $"no kept row of column {column.Name} has {CellText.Shown(term.EqualTo)}{NearestName.Hint(term.EqualTo, known)}";
    }
}
