using System.Text;

namespace Auditor.Cli.Tests;

/// <summary>A folder of its own for one test, gone afterwards.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false);

    public string Root { get; } = Directory.CreateTempSubdirectory("auditor-test-").FullName;

    public string At(string name) => Path.Combine(Root, name);

    public TemporaryFolder With(string name, string text) => With(name, Utf8.GetBytes(text));

    public TemporaryFolder With(string name, byte[] bytes)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(At(name))!);
        File.WriteAllBytes(At(name), bytes);
        return this;
    }

    public TemporaryFolder WithFolder(string name)
    {
        Directory.CreateDirectory(At(name));
        return this;
    }

    public string Text(string name) => File.ReadAllText(At(name), Utf8);

    /// <summary>Every file in it, as paths below it, in name order.</summary>
    public string[] Files() =>
        [.. Directory.GetFiles(Root, "*", SearchOption.AllDirectories).Select(file => Path.GetRelativePath(Root, file)).Order(StringComparer.Ordinal)];

    public void Dispose() => Directory.Delete(Root, recursive: true);
}
