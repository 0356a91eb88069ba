using Auditor.Data;
using Auditor.Design;
using Auditor.Results;

namespace Auditor.Rows;

/// <summary>
/// Which rows each fit uses and where the others went. A comparison of two fits means something only on the same rows: a group's own rows are
/// complete for the final model and the group, the common rows for the final model and every group. A row without a declared time, unit or cluster is
/// complete for nothing.
/// </summary>
public sealed class RowSelection
{
    private readonly BoundModel _model;
    private readonly Dictionary<DataColumn, ColumnGaps> _columnGaps;
    private readonly TermGaps _finalGaps;
    private readonly IReadOnlyList<TermGaps> _groupGaps;
    private readonly RowSubset _weighted;

    private RowSelection(BoundModel model, int threads)
    {
        _model = model;
        _columnGaps = ColumnGaps.Find([.. Sources(model)], model.Table.RowCount, threads);
        _weighted = Weighted(model);
        _finalGaps = TermGaps.Find([model.Response, .. model.FinalTerms], _weighted, model.Structure.Required, _columnGaps, threads);
        Final = _finalGaps.Complete(_weighted);
        _groupGaps = [.. model.Groups.Select(group => TermGaps.Find(group.Terms, Final, [], _columnGaps, threads))];
        Own = [.. _groupGaps.Select(gaps => gaps.Complete(Final))];
        Common = TermGaps.Union(_groupGaps.SelectMany(gaps => new[] { gaps.Incomplete, gaps.Undefined })) is { } any ? Final.Without(any) : Final;
    }

    /// <summary>Rows complete for the final model alone.</summary>
    public RowSubset Final { get; }

    /// <summary>For each group, rows complete for the final model and the group.</summary>
    public IReadOnlyList<RowSubset> Own { get; }

    /// <summary>Rows complete for the final model and every group.</summary>
    public RowSubset Common { get; }

    /// <param name="threads">Most threads to use; no row depends on it.</param>
    public static RowSelection Of(BoundModel model, int threads = 1) => new(model, threads);

    /// <param name="common">Whether incomplete and undefined count every group's gaps too, as the policy <c>row_set: common</c> says.</param>
    /// <param name="mentioned">Every column that the declaration names.</param>
    public RowAccount Account(bool common, IReadOnlyCollection<string> mentioned)
    {
        var gaps = (common ? _groupGaps : []).Prepend(_finalGaps).ToArray();
        var incomplete = TermGaps.Union(gaps.Select(gap => gap.Incomplete).Append(common ? UndefinedAndIncompleteForGroups() : null));
        var undefined = TermGaps.Union(gaps.Select(gap => gap.Undefined));
        return new RowAccount(
            _model.Table.RowCount,
            _model.Table.RowCount - _model.KeptRows.Count,
            _model.KeptRows.Count - _weighted.Count,
            incomplete?.Count ?? 0,
            (incomplete is null ? undefined : undefined?.Without(incomplete))?.Count ?? 0,
            (common ? Common : Final).Count,
            MissingByColumn(),
            UndefinedByTerm(),
            Unmentioned(mentioned));
    }

    private static IEnumerable<DataColumn> Sources(BoundModel model) =>
        model.Groups.SelectMany(group => group.Terms).Prepend(model.Response).Concat(model.FinalTerms)
            .SelectMany(term => term.Sources).Concat(model.Structure.Required).Distinct();

    private static RowSubset Weighted(BoundModel model)
    {
        if (model.Weights?.Column.Values is not { } weights)
        {
            return model.KeptRows;
        }

        var none = new RowBits(model.Table.RowCount);
        foreach (var row in model.KeptRows)
        {
            if (weights[row] == 0)
            {
                none.Set(row);
            }
        }

        return model.KeptRows.Without(none);
    }

    /// <summary>Rows undefined for the final model that miss a cell of a group: incomplete goes before undefined.</summary>
    private RowBits? UndefinedAndIncompleteForGroups()
    {
        var missing = TermGaps.Union(_model.Groups.SelectMany(group => group.Terms).SelectMany(term => term.Sources).Select(source => _columnGaps[source].Missing));
        return missing is null ? null : _finalGaps.Undefined?.And(missing);
    }

    private IReadOnlyList<string> Unmentioned(IReadOnlyCollection<string> mentioned) =>
        [.. _model.Table.SourceColumns.Index().Where(column => !mentioned.Contains(column.Item)).Select(column => CsvHeader.Shown(column.Item, column.Index))];

    private OrderedDictionary<string, int> MissingByColumn()
    {
        var counts = new OrderedDictionary<string, int>(StringComparer.Ordinal);
        foreach (var column in Sources(_model).OrderBy(Position))
        {
            counts[column.Name] = _columnGaps[column].Missing?.And(_weighted.Bits).Count ?? 0;
        }

        return counts;
    }

    /// <summary>The columns of the source in its order, then what terms built from other rows.</summary>
    private int Position(DataColumn column) =>
        _model.Table.Columns.Contains(column) ? _model.Table.SourceColumns.ToList().IndexOf(column.Name) : int.MaxValue;

    private OrderedDictionary<string, int> UndefinedByTerm()
    {
        var counts = new OrderedDictionary<string, int>(StringComparer.Ordinal);
        foreach (var (term, count) in _groupGaps.Prepend(_finalGaps).SelectMany(gaps => gaps.UndefinedByTerm))
        {
            counts[term] = count;
        }

        return counts;
    }
}
