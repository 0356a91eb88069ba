using System.Security.Cryptography;
using System.Text;
using Auditor.Data;

namespace Auditor.Cli;

/// <summary>A text file read whole: strict UTF-8, with the hash of its bytes.</summary>
internal sealed record FileText(string Text, string Sha256)
{
    public static Reading<FileText> Read(string path)
    {
        byte[] bytes = [];
        try
        {
            bytes = File.ReadAllBytes(path);
            return Reading<FileText>.Of(new FileText(new UTF8Encoding(false, true).GetString(bytes), Hash(bytes)));
        }
        catch (DecoderFallbackException)
        {
            return Reading<FileText>.Failed(Utf8Check.Problem(path, new MemoryStream(bytes)));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException or ArgumentException)
        {
            return Reading<FileText>.Failed(new Problem(path, null, FileFault.Of(path, fault)));
        }
    }

    public static string Hash(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}

/// <summary>The file of the same folder whose name is nearest to one that does not exist.</summary>
internal static class NearestFile
{
    public static string Hint(string path) =>
        Path.GetDirectoryName(Path.GetFullPath(path)) is { } folder && Directory.Exists(folder)
            ? Yaml.NearestName.DidYouMean(Path.GetFileName(path), [.. Directory.GetFiles(folder).Select(file => Path.GetFileName(file)!)])
            : "";
}

/// <summary>Why a file cannot be read, in words.</summary>
internal static class FileFault
{
    public static string Of(string path, Exception fault) =>
        Directory.Exists(path) ? "this is a folder, a file is needed"
        : fault is FileNotFoundException or DirectoryNotFoundException ? "the file does not exist" + NearestFile.Hint(path)
        : "the file cannot be read: " + fault.Message;
}
