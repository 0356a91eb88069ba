using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>What terms are bound to, and what was found while binding.</summary>
internal sealed class BindingScope(
    DataTable table, RowSubset keptRows, IReadOnlyDictionary<string, ColumnDeclaration> declared, Period? period, TimeOrder? order, string file)
{
    private readonly Dictionary<string, LevelCoding> _codings = new(StringComparer.Ordinal);
    private readonly HashSet<BindingNote> _noted = [];
    private readonly List<BindingNote> _notes = [];

    public RowSubset KeptRows { get; } = keptRows;

    public Period? Period { get; } = period;

    public int TableRows => table.RowCount;

    /// <summary>In the order they were met, none twice.</summary>
    public IReadOnlyList<BindingNote> Notes => _notes;

    /// <summary>The problems of the term that is being bound.</summary>
    public List<Problem> Problems { get; } = [];

    public DataColumn this[ColumnTerm term] => table[term.Column];

    public void Note(BindingNote note)
    {
        if (_noted.Add(note))
        {
            _notes.Add(note);
        }
    }

    /// <summary>Adds a problem at the term's line; always null, so that it can stand where a bound term would.</summary>
    public BoundTerm? Refuse(Term term, string message)
    {
        Add(new Problem(file, term.Line > 0 ? term.Line : null, message));
        return null;
    }

    /// <summary>The rows by unit and period; null when there is no such order, which is said once, at the declared time, unless it is the term that cannot have it.</summary>
    public TimeSteps? Steps(TimeOrderTerm term)
    {
        if (order is null)
        {
            Refuse(term, $"{term.Label}: no order of the rows is declared (data.time)");
            return null;
        }

        foreach (var message in order.Problems)
        {
            Add(new Problem(file, order.Line, message));
        }

        return order.Steps;
    }

    /// <summary>The coding of a levels column, made once; null when it has problems, which are those of the column and not of one term.</summary>
    public LevelCoding? Coding(LevelsColumn column, Term term)
    {
        var declaration = declared.GetValueOrDefault(column.Name);
        if (!_codings.TryGetValue(column.Name, out var coding))
        {
            _codings[column.Name] = coding = LevelCoding.Of(column, declaration, KeptRows);
        }

        foreach (var message in coding.Problems)
        {
            Add(new Problem(file, declaration?.Line ?? (term.Line > 0 ? term.Line : null), message));
        }

        return coding.Problems.Count == 0 ? coding : null;
    }

    private void Add(Problem problem)
    {
        if (!Problems.Contains(problem))
        {
            Problems.Add(problem);
        }
    }
}
