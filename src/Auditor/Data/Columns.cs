using System.Globalization;
using Auditor.Numerics.Storage;

namespace Auditor.Data;

/// <summary>Finite numbers; NaN is a missing value.</summary>
public sealed class NumberColumn(string name, Cells<double> values) : DataColumn(name)
{
    public NumberColumn(string name, double[] values)
        : this(name, new ArrayCells<double>(values))
    {
    }

    public Cells<double> Values { get; } = values;

    public override ColumnKind Kind => ColumnKind.Number;

    public override int Length => Values.Count;

    public override bool IsMissing(int row) => double.IsNaN(Values[row]);

    public override string? Text(int row) => IsMissing(row) ? null : Values[row].ToString("R", CultureInfo.InvariantCulture);
}

/// <summary>Codes into the distinct texts of the column; -1 is a missing value. Which level is the reference is decided when terms are bound.</summary>
public sealed class LevelsColumn(string name, Cells<int> codes, IReadOnlyList<string> texts) : DataColumn(name)
{
    public LevelsColumn(string name, int[] codes, IReadOnlyList<string> texts)
        : this(name, new ArrayCells<int>(codes), texts)
    {
    }

    public Cells<int> Codes { get; } = codes;

    /// <summary>The distinct texts, numbered as they first appear in the source (so numbering does not depend on how it was read).</summary>
    public IReadOnlyList<string> Texts { get; } = texts;

    public override ColumnKind Kind => ColumnKind.Levels;

    public override int Length => Codes.Count;

    public override bool IsMissing(int row) => Codes[row] < 0;

    public override string? Text(int row) => Codes[row] < 0 ? null : Texts[Codes[row]];
}

/// <summary>Days since 0001-01-01 (DateOnly.DayNumber); <see cref="Missing"/> is a missing value.</summary>
public sealed class DateColumn(string name, Cells<int> days) : DataColumn(name)
{
    public const int Missing = int.MinValue;

    public DateColumn(string name, int[] days)
        : this(name, new ArrayCells<int>(days))
    {
    }

    public Cells<int> Days { get; } = days;

    public override ColumnKind Kind => ColumnKind.Date;

    public override int Length => Days.Count;

    public override bool IsMissing(int row) => Days[row] == Missing;

    public override string? Text(int row) => IsMissing(row)
        ? null
        : DateOnly.FromDayNumber(Days[row]).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
}

/// <summary>Free text, such as a row label; null is a missing value.</summary>
public sealed class TextColumn(string name, IReadOnlyList<string?> values) : DataColumn(name)
{
    public IReadOnlyList<string?> Values { get; } = values;

    public override ColumnKind Kind => ColumnKind.Text;

    public override int Length => Values.Count;

    public override bool IsMissing(int row) => Values[row] is null;

    public override string? Text(int row) => Values[row];
}
