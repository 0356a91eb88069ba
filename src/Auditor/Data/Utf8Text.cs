using System.Text;

namespace Auditor.Data;

/// <summary>
/// UTF-8 bytes in memory as text, decoded straight into the reader's own buffer. Strict: bad bytes are refused, they must not become replacement characters.
/// </summary>
internal sealed class Utf8Text(ReadOnlyMemory<byte> bytes) : TextReader
{
    private static readonly UTF8Encoding Strict = new(encoderShouldEmitUTF8Identifier: true, throwOnInvalidBytes: true);

    private readonly Decoder _decoder = Strict.GetDecoder();
    private ReadOnlyMemory<byte> _rest = bytes;

    /// <summary>A byte order mark of UTF-8 at the start of a file is no text of it. One of UTF-16 is not UTF-8.</summary>
    public static ReadOnlyMemory<byte> WithoutMark(ReadOnlyMemory<byte> bytes) =>
        bytes.Span.StartsWith(Strict.Preamble) ? bytes[Strict.Preamble.Length..] : bytes;

    public override int Read(Span<char> buffer)
    {
        _decoder.Convert(_rest.Span, buffer, flush: true, out var used, out var made, out _);
        _rest = _rest[used..];
        return made;
    }

    public override int Read(char[] buffer, int index, int count) => Read(buffer.AsSpan(index, count));
}
