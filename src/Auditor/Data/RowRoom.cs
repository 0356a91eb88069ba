namespace Auditor.Data;

/// <summary>For how many rows the columns' arrays have room: all of them from the start where the estimate holds, since growing copies every column.</summary>
/// <param name="stored">The file as stored, compressed or not: how much of it is used up says how many rows are to come.</param>
/// <param name="expected">The number of rows if it is known or nearly, else 0.</param>
internal sealed class RowRoom(Stream stored, int expected)
{
    /// <summary>What an estimate is raised by, so that a row more than expected does not copy everything.</summary>
    private const double Margin = 1.02;

    /// <summary>Without any knowledge of the file's size.</summary>
    private const double Blind = 1.5;

    private int _room;

    /// <summary>About how many rows there are in all, as far as that can be told.</summary>
    public double Expected { get; private set; }

    /// <summary>The new room if these rows need more, else null.</summary>
    public int? Grown(CsvChunk chunk)
    {
        var needed = checked(chunk.Row + chunk.Rows);
        if (needed <= _room)
        {
            return null;
        }

        var estimate = _room == 0 && expected > 0 ? expected : chunk.Ends ? needed : needed * (stored.CanSeek ? Margin / Share() : Blind);
        Expected = estimate;
        _room = (int)Math.Max(needed, Math.Min(estimate, Array.MaxLength));
        return _room;
    }

    public ReadingProgress Progress(CsvChunk chunk) =>
        stored.CanSeek ? new(chunk.Row + chunk.Rows, stored.Position, stored.Length) : new(chunk.Row + chunk.Rows, 0, null);

    private double Share() => stored.Length == 0 ? 1 : Math.Max(1e-6, (double)stored.Position / stored.Length);
}
