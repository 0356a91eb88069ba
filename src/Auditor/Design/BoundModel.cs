using Auditor.Data;
using Auditor.Declaration;

namespace Auditor.Design;

/// <summary>A declaration bound to its data: every term can make its columns, nothing is fitted yet.</summary>
/// <param name="KeptRows">Rows of the table that the row filter leaves.</param>
public sealed record BoundModel(
    DataTable Table,
    RowSubset KeptRows,
    bool Intercept,
    BoundTerm Response,
    IReadOnlyList<BoundTerm> FinalTerms,
    IReadOnlyList<BoundGroup> Groups,
    BoundWeights? Weights)
{
    /// <summary>What the author says about dependence between rows.</summary>
    public BoundStructure Structure { get; init; } = BoundStructure.None;

    /// <summary>The declared column that names rows for readers.</summary>
    public DataColumn? RowLabel { get; init; }
}

/// <summary>A left-out group whose terms are bound.</summary>
public sealed record BoundGroup(LeftOutGroup Declared, IReadOnlyList<BoundTerm> Terms);

/// <summary>The column of weights and what they mean; checked: no negative and no missing weight on a kept row.</summary>
public sealed record BoundWeights(NumberColumn Column, WeightKind Kind, WeightsDeclaration Declared);
