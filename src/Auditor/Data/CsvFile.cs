using System.Globalization;
using System.IO.Compression;
using System.Runtime.ExceptionServices;
using System.Text;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>A delimited file as rows of fields: opens it, and turns everything that keeps it from being read into problems.</summary>
internal sealed class CsvFile(string name, Func<Stream> open, DelimitedFormat format)
{
    public string Name { get; } = name;

    /// <summary>Opens the bytes as stored, and through them the text's bytes; both are closed together.</summary>
    public (Stream Stored, Stream Text) Open()
    {
        var stored = open();
        return (stored, format.Gzip ? new GZipStream(stored, CompressionMode.Decompress) : stored);
    }

    /// <summary>Runs a pass over the open file; what it throws for unusable input comes back as a problem.</summary>
    public IReadOnlyList<Problem> Pass(Func<SepReader, IReadOnlyList<Problem>> pass)
    {
        try
        {
            // Strict decoding, as in Utf8Text; a byte order mark of UTF-8 is skipped.
            using var reader = Reader(new StreamReader(Open().Text, new UTF8Encoding(true, true), detectEncodingFromByteOrderMarks: false, bufferSize: 1 << 14));
            return pass(reader);
        }
        catch (Exception fault)
        {
            return [Problem(fault)];
        }
    }

    /// <summary>A reader of the fields of text.</summary>
    public SepReader Reader(TextReader text) => Sep.New(format.Separator)
        .Reader(options => options with { HasHeader = false, DisableColCountCheck = true, CultureInfo = CultureInfo.InvariantCulture })
        .From(text);

    /// <summary>What was thrown as a problem of the input; thrown again when it is none.</summary>
    public Problem Problem(Exception fault)
    {
        if (fault is DecoderFallbackException)
        {
            return NotUtf8();
        }

        if (fault is InvalidDataException && format.Gzip)
        {
            return new Problem(Name, null, "found bytes that do not unpack, expected a complete gzip file");
        }

        if (fault is NotSupportedException && fault.Message.Contains("maximum supported length", StringComparison.Ordinal))
        {
            return new Problem(Name, null, "found a row of more than 16 million characters, expected a quotation mark that is opened to be closed");
        }

        ExceptionDispatchInfo.Throw(fault);
        throw fault;
    }

    private Problem NotUtf8()
    {
        using var stream = Open().Text;
        return Utf8Check.Problem(Name, stream);
    }
}
