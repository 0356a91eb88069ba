namespace Auditor.Tests;

/// <summary>Folders of the repository that tests read, found upwards from where the tests run.</summary>
internal static class TestFolders
{
    public static string Root { get; } = FindRoot();

    public static string Reference => Path.Combine(Root, "tests", "reference");

    public static string Vectors => Path.Combine(Root, "tests", "vectors");

    public static string Demo => Path.Combine(Root, "templates", "demo");

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "Auditor.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("No Auditor.sln above " + AppContext.BaseDirectory);
    }
}
