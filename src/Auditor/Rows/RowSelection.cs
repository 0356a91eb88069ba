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
    private readonly TermGaps _finalGaps;
    private readonly IReadOnlyList<TermGaps> _groupGaps;
    private readonly RowSubset _weighted;

    private RowSelection(BoundModel model)
    {
        _model = model;
        var weights = model.Weights?.Column.Values;
        _weighted = new RowSubset(weights is null ? model.KeptRows : [.. model.KeptRows.Where(row => weights[row] != 0)]);
        _finalGaps = TermGaps.Find([model.Response, .. model.FinalTerms], _weighted, model.Structure.Required);
        Final = _weighted.Without(_finalGaps.Both);
        _groupGaps = [.. model.Groups.Select(group => TermGaps.Find(group.Terms, Final, []))];
        Own = [.. _groupGaps.Select(gaps => Final.Without(gaps.Both))];
        Common = Final.Without([.. _groupGaps.SelectMany(gaps => gaps.Both).Distinct()]);
    }

    /// <summary>Rows complete for the final model alone.</summary>
    public RowSubset Final { get; }

    /// <summary>For each group, rows complete for the final model and the group.</summary>
    public IReadOnlyList<RowSubset> Own { get; }

    /// <summary>Rows complete for the final model and every group.</summary>
    public RowSubset Common { get; }

    public static RowSelection Of(BoundModel model) => new(model);

    /// <param name="common">Whether incomplete and undefined count every group's gaps too, as the policy <c>row_set: common</c> says.</param>
    /// <param name="mentioned">Every column that the declaration names.</param>
    public RowAccount Account(bool common, IReadOnlyCollection<string> mentioned)
    {
        var gaps = (common ? _groupGaps : []).Prepend(_finalGaps).ToArray();
        var incomplete = gaps.SelectMany(gap => gap.Incomplete).ToHashSet();
        incomplete.UnionWith(common ? _finalGaps.Undefined.Where(LacksGroupValue) : []);
        var undefined = gaps.SelectMany(gap => gap.Undefined).ToHashSet();
        undefined.ExceptWith(incomplete);
        return new RowAccount(
            _model.Table.RowCount,
            _model.Table.RowCount - _model.KeptRows.Length,
            _model.KeptRows.Length - _weighted.Count,
            incomplete.Count,
            undefined.Count,
            (common ? Common : Final).Count,
            MissingByColumn(),
            UndefinedByTerm(),
            Unmentioned(mentioned));
    }

    private IReadOnlyList<string> Unmentioned(IReadOnlyCollection<string> mentioned) =>
        [.. _model.Table.SourceColumns.Index().Where(column => !mentioned.Contains(column.Item)).Select(column => CsvHeader.Shown(column.Item, column.Index))];

    private bool LacksGroupValue(int row) =>
        _model.Groups.Any(group => group.Terms.Any(term => term.Sources.Any(source => source.IsMissing(row))));

    private OrderedDictionary<string, int> MissingByColumn()
    {
        var counts = new OrderedDictionary<string, int>(StringComparer.Ordinal);
        var terms = _model.Groups.SelectMany(group => group.Terms).Prepend(_model.Response).Concat(_model.FinalTerms);
        foreach (var column in terms.SelectMany(term => term.Sources).Concat(_model.Structure.Required).Distinct().OrderBy(Position))
        {
            counts[column.Name] = _weighted.Rows.Count(column.IsMissing);
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
