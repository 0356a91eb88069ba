namespace Auditor.Tests;

/// <summary>Finds files of the repository from where the tests run.</summary>
internal static class Repository
{
    public static string Root { get; } = Find();

    /// <summary>Reads a file by its path below the root.</summary>
    public static string Text(params string[] path) => File.ReadAllText(System.IO.Path.Combine([Root, .. path]));

    /// <summary>The place in this checkout of a path that the compiler wrote, which in a deterministic build does not begin with the root.</summary>
    public static string Path(string compiled)
    {
        int tests = compiled.Replace('\\', '/').LastIndexOf("/tests/", StringComparison.Ordinal);
        return tests < 0 ? compiled : System.IO.Path.Combine(Root, compiled[(tests + 1)..]);
    }

    private static string Find()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(System.IO.Path.Combine(folder.FullName, "Auditor.sln")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException($"No folder above {AppContext.BaseDirectory} holds Auditor.sln.");
    }
}
