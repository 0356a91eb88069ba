namespace Auditor.Cli;

/// <summary>Files that ship beside the program.</summary>
internal static class BundledFiles
{
    public static string DemoDeclaration => Path.Combine(Templates, "demo", "declaration.yaml");

    public static string Rules => Path.Combine(AppContext.BaseDirectory, "rules");

    public static string Policy => Path.Combine(Rules, "policy.yaml");

    private static string Templates => Path.Combine(AppContext.BaseDirectory, "templates");

    public static string ReadTemplate(string name) => File.ReadAllText(Path.Combine(Templates, "report", name));
}
