using System.Collections.Concurrent;

namespace Auditor.Tests.Reference;

/// <summary>Reads files of tests/reference and remembers which ones were read, so that a test can say that none is carried for nothing.</summary>
internal static class ReferenceFiles
{
    private static readonly ConcurrentDictionary<string, bool> Seen = new();

    public static IReadOnlyCollection<string> Opened => [.. Seen.Keys];

    /// <summary>All files carried, relative to tests/reference, with forward slashes.</summary>
    public static IReadOnlyList<string> Carried { get; } =
    [
        .. Directory.EnumerateFiles(TestFolders.Reference, "*", SearchOption.AllDirectories)
            .Select(path => Path.GetRelativePath(TestFolders.Reference, path).Replace('\\', '/'))
            .Where(path => !path.Contains("__pycache__", StringComparison.Ordinal))
            .Order(StringComparer.Ordinal),
    ];

    public static string FullPath(string relative)
    {
        Seen[relative] = true;
        return Path.Combine(TestFolders.Reference, relative);
    }

    public static string ReadText(string relative) => File.ReadAllText(FullPath(relative));
}
