using System.Globalization;
using System.IO.Compression;
using System.Text;
using nietras.SeparatedValues;

namespace Auditor.Data;

/// <summary>A delimited file as rows of fields: opens it, and turns everything that keeps it from being read into problems.</summary>
internal sealed class CsvFile(string name, Func<Stream> open, DelimitedFormat format)
{
    public string Name { get; } = name;

    /// <summary>Size of the text, when it can be known before reading it.</summary>
    public long? Length()
    {
        using var stream = open();
        return stream.CanSeek && !format.Gzip ? stream.Length : null;
    }

    /// <summary>Runs a pass over the open file; what it throws for unusable input comes back as a problem.</summary>
    public IReadOnlyList<Problem> Pass(Func<SepReader, IReadOnlyList<Problem>> pass)
    {
        try
        {
            using var reader = Reader();
            return pass(reader);
        }
        catch (DecoderFallbackException)
        {
            return [NotUtf8()];
        }
        catch (InvalidDataException) when (format.Gzip)
        {
            return [new Problem(Name, null, "found bytes that do not unpack, expected a complete gzip file")];
        }
        catch (NotSupportedException fault) when (fault.Message.Contains("maximum supported length", StringComparison.Ordinal))
        {
            return [new Problem(Name, null, "found a row of more than 16 million characters, expected a quotation mark that is opened to be closed")];
        }
    }

    private SepReader Reader()
    {
        // Strict decoding: bad bytes must not become replacement characters. A byte order mark of UTF-8 is skipped, one of UTF-16 is not UTF-8.
        var text = new StreamReader(Content(), new UTF8Encoding(true, true), detectEncodingFromByteOrderMarks: false, bufferSize: 1 << 16);
        return Sep.New(format.Separator)
            .Reader(options => options with { HasHeader = false, DisableColCountCheck = true, CultureInfo = CultureInfo.InvariantCulture })
            .From(text);
    }

    private Stream Content() => format.Gzip ? new GZipStream(open(), CompressionMode.Decompress) : open();

    private Problem NotUtf8()
    {
        using var stream = Content();
        return Utf8Check.Problem(Name, stream);
    }
}
