using System.Buffers;
using System.Globalization;
using System.Text;

namespace Auditor.Data;

/// <summary>Finds the first byte of a stream that is not UTF-8, after decoding has failed.</summary>
public static class Utf8Check
{
    /// <summary>The place of the first such byte, in words.</summary>
    public static Problem Problem(string file, Stream stream) => FirstFault(stream) is var (line, column, found)
        ? new Problem(file, line, string.Create(CultureInfo.InvariantCulture, $"found byte 0x{found:X2} at byte {column} of the line, expected UTF-8; store the file as UTF-8"))
        : new Problem(file, null, "found bytes that are not UTF-8; store the file as UTF-8");

    /// <summary>1-based line, 1-based byte within the line, and the byte; null when all is well.</summary>
    public static (int Line, int Byte, byte Found)? FirstFault(Stream stream)
    {
        var buffer = new byte[1 << 16];
        int held = 0, line = 1, column = 0;
        while (true)
        {
            var got = stream.Read(buffer, held, buffer.Length - held);
            var bytes = buffer.AsSpan(0, held + got);
            while (!bytes.IsEmpty)
            {
                var status = Rune.DecodeFromUtf8(bytes, out var rune, out var used);
                if (status == OperationStatus.NeedMoreData && got > 0)
                {
                    break;
                }

                if (status != OperationStatus.Done)
                {
                    return (line, column + 1, bytes[0]);
                }

                (line, column) = rune.Value == '\n' ? (line + 1, 0) : (line, column + used);
                bytes = bytes[used..];
            }

            if (got == 0)
            {
                return null;
            }

            held = bytes.Length;
            bytes.CopyTo(buffer);
        }
    }
}
