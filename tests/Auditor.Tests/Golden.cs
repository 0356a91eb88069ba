using System.Globalization;
using System.Runtime.CompilerServices;
using System.Text;

namespace Auditor.Tests;

/// <summary>
/// Compares text with a kept file. The file is written only when AUDITOR_BLESS is 1; look at the change before it is committed.
/// </summary>
internal static class Golden
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <param name="actual">What the code makes now.</param>
    /// <param name="name">File below the folder golden beside the calling test.</param>
    /// <param name="caller">Filled by the compiler.</param>
    public static void Matches(string actual, string name, [CallerFilePath] string caller = "")
    {
        string path = Path.Combine(Path.GetDirectoryName(Repository.Path(caller))!, "golden", name);
        if (Environment.GetEnvironmentVariable("AUDITOR_BLESS") == "1")
        {
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllText(path, actual, Utf8);
            return;
        }

        Assert.True(File.Exists(path), $"There is no golden file {name}. Run with AUDITOR_BLESS=1 to write it.");
        string? difference = FirstDifference(File.ReadAllText(path, Utf8), actual);
        Assert.True(difference is null, $"{name}: {difference}\nRun with AUDITOR_BLESS=1 to accept it.");
    }

    /// <summary>Null when equal; else the first line that differs, both ways.</summary>
    public static string? FirstDifference(string expected, string actual)
    {
        string[] wanted = expected.Split('\n');
        string[] got = actual.Split('\n');
        int line = wanted.Zip(got).TakeWhile(pair => pair.First == pair.Second).Count();
        return line == wanted.Length && line == got.Length
            ? null
            : string.Create(CultureInfo.InvariantCulture, $"line {line + 1} differs\n  expected: {At(wanted, line)}\n  actual:   {At(got, line)}");
    }

    private static string At(string[] lines, int line) => line < lines.Length ? lines[line] : "(the text has ended)";
}
