namespace Auditor.Results;

/// <summary>Where every row of the source went; read is the sum of the other five, tested in that order.</summary>
/// <param name="MissingByColumn">Missing cells, over the rows that the filter and the weights leave, of every column the audit uses.</param>
/// <param name="UndefinedByTerm">Rows, over the same, where a transform has no value although its columns do.</param>
public sealed record RowAccount(
    int Read,
    int FilteredOut,
    int ZeroWeight,
    int Incomplete,
    int Undefined,
    int Used,
    IReadOnlyDictionary<string, int> MissingByColumn,
    IReadOnlyDictionary<string, int> UndefinedByTerm,
    IReadOnlyList<string> ColumnsNobodyMentions);
