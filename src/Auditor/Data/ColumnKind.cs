namespace Auditor.Data;

/// <summary>What the cells of a column are.</summary>
public enum ColumnKind
{
    Number,
    Levels,
    Date,
    Text,
}
