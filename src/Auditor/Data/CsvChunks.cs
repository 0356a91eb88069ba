using System.Buffers;

namespace Auditor.Data;

/// <summary>Whole rows of a delimited file as bytes, in pooled memory until disposed.</summary>
/// <param name="Index">0 for the first chunk, which starts with the header.</param>
/// <param name="Row">Data rows before it, blank lines within the file included.</param>
/// <param name="Line">Lines before it.</param>
/// <param name="Rows">Data rows in it.</param>
/// <param name="Ends">Whether it is the last one: blank lines at its end are no rows, so there may be fewer.</param>
internal sealed record CsvChunk(byte[] Buffer, int Length, int Index, int Row, int Line, int Rows, bool Ends) : IDisposable
{
    public Utf8Text Text()
    {
        var bytes = Buffer.AsMemory(0, Length);
        return new Utf8Text(Index == 0 ? Utf8Text.WithoutMark(bytes) : bytes);
    }

    public void Dispose() => ArrayPool<byte>.Shared.Return(Buffer);
}

/// <summary>
/// Divides the bytes of a delimited file into chunks of whole rows, so that several threads can read rows, each knowing which ones they are. A row with line
/// ends between quotation marks is never divided.
/// </summary>
internal sealed class CsvChunks(Stream stream, int usualBytes) : IDisposable
{
    /// <summary>A row that does not end within so many bytes has more characters than a row may have; the reader of fields says so.</summary>
    private const int MostBytes = 1 << 26;

    private byte[] _buffer = ArrayPool<byte>.Shared.Rent(usualBytes);
    private int _held;
    private int _index;
    private int _row;
    private int _line;
    private bool _ended;

    /// <summary>The next rows, null after the last.</summary>
    public CsvChunk? Next()
    {
        var length = Fill();
        if (length == 0)
        {
            return null;
        }

        var (rows, lines) = RowEnds.Count(_buffer.AsSpan(0, length));
        var chunk = new CsvChunk(_buffer, length, _index, _row, _line, _index == 0 ? rows - 1 : rows, _ended);
        (_index, _row, _line) = (_index + 1, checked(_row + chunk.Rows), checked(_line + lines));
        CarryOver(length);
        return chunk;
    }

    public void Dispose() => ArrayPool<byte>.Shared.Return(_buffer);

    /// <summary>Fills the buffer; the number of bytes that are whole rows.</summary>
    private int Fill()
    {
        while (!_ended)
        {
            _held += stream.ReadAtLeast(_buffer.AsSpan(_held), _buffer.Length - _held, throwOnEndOfStream: false);
            _ended = _held < _buffer.Length;
            if (_ended)
            {
                break;
            }

            if (RowEnds.LastCut(_buffer.AsSpan(0, _held)) is var cut and > 0)
            {
                return cut;
            }

            _ended = _held >= MostBytes && !IsBlank(_buffer[0]);
            Widen();
        }

        return _held;
    }

    private static bool IsBlank(byte first) => first is (byte)'\n' or (byte)'\r';

    private void Widen()
    {
        var wider = ArrayPool<byte>.Shared.Rent(checked(2 * _buffer.Length));
        _buffer.AsSpan(0, _held).CopyTo(wider);
        ArrayPool<byte>.Shared.Return(_buffer);
        _buffer = wider;
    }

    /// <summary>What follows the whole rows starts the next chunk, in a buffer of its own.</summary>
    private void CarryOver(int length)
    {
        var rest = _buffer.AsSpan(length, _held - length);
        var next = ArrayPool<byte>.Shared.Rent(Math.Max(usualBytes, rest.Length + 1));
        rest.CopyTo(next);
        (_buffer, _held) = (next, rest.Length);
    }
}
