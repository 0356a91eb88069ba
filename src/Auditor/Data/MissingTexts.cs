namespace Auditor.Data;

/// <summary>
/// The texts that mean "no value". A cell is compared as it stands, without trimming and with its case, in quotation marks or not;
/// only the empty text also stands for a cell of nothing but white space.
/// </summary>
internal sealed class MissingTexts
{
    private readonly HashSet<string>.AlternateLookup<ReadOnlySpan<char>> _texts;
    private readonly bool _empty;

    public MissingTexts(IReadOnlyList<string> texts)
    {
        var set = new HashSet<string>(texts, StringComparer.Ordinal);
        _texts = set.GetAlternateLookup<ReadOnlySpan<char>>();
        _empty = set.Contains(string.Empty);
        HasNumbers = texts.Any(text => CellText.TryNumber(text, out _));
    }

    /// <summary>Whether a cell that reads as a number may still mean "no value", as with -99.</summary>
    public bool HasNumbers { get; }

    public bool Contains(ReadOnlySpan<char> cell) => _texts.Contains(cell) || (_empty && cell.IsWhiteSpace());
}
