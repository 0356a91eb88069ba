namespace Auditor.Data;

/// <summary>
/// Where rows end in the bytes of a delimited file, told without dividing it into fields. A line end is LF, CR LF or CR; it ends a row where the number of
/// quotation marks before it is even, which is how the reader of fields sees it too, in well-formed text and in any other.
/// </summary>
internal static class RowEnds
{
    private const byte Mark = (byte)'"';
    private const byte LineFeed = (byte)'\n';
    private const byte Return = (byte)'\r';

    /// <summary>
    /// The number of bytes, from the start of a row, after which whole rows end, as many as can be told for certain; 0 when none. The last of these rows is not
    /// blank: whether blank lines are rows depends on what follows them.
    /// </summary>
    public static int LastCut(ReadOnlySpan<byte> bytes)
    {
        var inside = bytes.Count(Mark) % 2 != 0;
        var end = bytes.Length;
        while (end > 0)
        {
            var start = bytes[..end].LastIndexOf(Mark) + 1;
            if (!inside && CutWithin(bytes, start, end) is var cut and > 0)
            {
                return cut;
            }

            end = start - 1;
            inside = !inside;
        }

        return 0;
    }

    /// <summary>How many rows end, and how many lines, in bytes that start with a row. What follows the last end is one more of each.</summary>
    public static (int Rows, int Lines) Count(ReadOnlySpan<byte> bytes)
    {
        var marks = bytes.Count(Mark);
        var openLine = !bytes.IsEmpty && bytes[^1] is not (LineFeed or Return) ? 1 : 0;
        var openRow = marks % 2 != 0 ? 1 : openLine;
        var ends = LineEnds(bytes);
        return ((marks > 0 ? EndsOutside(bytes) : ends) + openRow, ends + openLine);
    }

    /// <summary>The end of the last row in a stretch outside quotation marks; 0 when there is none.</summary>
    private static int CutWithin(ReadOnlySpan<byte> bytes, int start, int end)
    {
        while (end > start)
        {
            var last = bytes[start..end].LastIndexOfAny(LineFeed, Return);
            var text = last < 0 ? -1 : bytes[..(start + last)].LastIndexOfAnyExcept(LineFeed, Return);
            if (text < 0 || text + 1 < start)
            {
                return 0;
            }

            // A return at the very end may be half a line end.
            if (bytes[text + 1] == LineFeed)
            {
                return text + 2;
            }

            if (text + 2 < bytes.Length)
            {
                return bytes[text + 2] == LineFeed ? text + 3 : text + 2;
            }

            end = text + 1;
        }

        return 0;
    }

    private static int LineEnds(ReadOnlySpan<byte> bytes)
    {
        var ends = bytes.Count(LineFeed);
        return bytes.Contains(Return) ? ends + bytes.Count(Return) - bytes.Count("\r\n"u8) : ends;
    }

    private static int EndsOutside(ReadOnlySpan<byte> bytes)
    {
        var ends = 0;
        for (var inside = false; !bytes.IsEmpty; inside = !inside)
        {
            var mark = bytes.IndexOf(Mark);
            var stretch = mark < 0 ? bytes : bytes[..mark];
            ends += inside ? 0 : LineEnds(stretch);
            bytes = mark < 0 ? [] : bytes[(mark + 1)..];
        }

        return ends;
    }
}
