namespace Auditor.Cli;

/// <summary>Files that ship beside the program.</summary>
internal static class BundledFiles
{
    public static string DemoDeclaration => Path.Combine(Templates, "demo", "declaration.yaml");

    public static string Rules => Path.Combine(AppContext.BaseDirectory, "rules");

    public static string Policy => Path.Combine(Rules, "policy.yaml");

    /// <summary>Folder of the cases that the self-test compares.</summary>
    public static string SelfTestCases => Path.Combine(AppContext.BaseDirectory, "self-test");

    private static string Templates => Path.Combine(AppContext.BaseDirectory, "templates");

    public static string ReadTemplate(string name) => File.ReadAllText(Path.Combine(Templates, "report", name));

    /// <summary>The page of the self-test has a template of its own, and shares tables and style with the report.</summary>
    public static string ReadSelfTestTemplate(string name)
    {
        var own = Path.Combine(Templates, "self-test", name);
        return File.Exists(own) ? File.ReadAllText(own) : ReadTemplate(name);
    }
}
