namespace Auditor.Declaration;

/// <summary>
/// A term as declared: a name for columns that do not exist yet. It has a label and the columns it mentions, and no data.
/// Only a bound term (namespace Design) makes columns. Two terms are equal when they say the same thing, wherever they stand.
/// </summary>
public abstract record Term
{
    /// <summary>The line of the declaration, for messages; not part of what the term is.</summary>
    public int Line { get; init; }

    /// <summary>The term's label without level or number, as in <c>exclusions[].terms</c> of the record.</summary>
    public abstract string Label { get; }

    /// <summary>The terms this one is made of, none for a column.</summary>
    public abstract IReadOnlyList<Term> Parts { get; }

    /// <summary>The data columns it mentions, in order, possibly repeated.</summary>
    public virtual IEnumerable<ColumnTerm> Columns => Parts.SelectMany(part => part.Columns);

    /// <summary>The label as an operand of another label: in brackets when it is made with a sign between operands.</summary>
    internal string Operand => IsInfix ? "(" + Label + ")" : Label;

    /// <summary>Whether the label is made with a sign between operands.</summary>
    protected virtual bool IsInfix => false;

    public virtual bool Equals(Term? other) => other is not null && EqualityContract == other.EqualityContract;

    public override int GetHashCode() => EqualityContract.GetHashCode();
}
