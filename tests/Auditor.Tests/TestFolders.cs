namespace Auditor.Tests;

/// <summary>Folders of the repository that tests read.</summary>
internal static class TestFolders
{
    public static string Root => Repository.Root;

    public static string Reference => Path.Combine(Root, "tests", "reference");

    public static string Vectors => Path.Combine(Root, "tests", "vectors");

    public static string Demo => Path.Combine(Root, "templates", "demo");
}
