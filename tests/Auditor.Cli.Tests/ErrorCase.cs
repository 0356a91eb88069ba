namespace Auditor.Cli.Tests;

/// <summary>One way of using the program wrongly.</summary>
/// <param name="Title">What is wrong, for readers of the golden file.</param>
/// <param name="Arrange">Puts things into a folder that holds lease.yaml and leases.csv.</param>
internal sealed record ErrorCase(string Title, string[] Arguments, Action<TemporaryFolder> Arrange)
{
    public static ErrorCase Of(string title, params string[] arguments) => new(title, arguments, _ => { });

    /// <summary>The least declaration with some text of it put in another way.</summary>
    public static ErrorCase Declared(string title, string text, string instead, params string[] options) =>
        new(title, ["lease.yaml", .. options], folder => folder.With("lease.yaml", Replaced(text, instead)));

    public static ErrorCase Data(string title, string csv) => new(title, ["lease.yaml"], folder => folder.With("leases.csv", csv));

    public static ErrorCase File(string title, string name, string text, params string[] arguments) =>
        new(title, arguments, folder => folder.With(name, text));

    private static string Replaced(string text, string instead)
    {
        Assert.Contains(text, Leases.Declaration, StringComparison.Ordinal);
        return Leases.Declaration.Replace(text, instead, StringComparison.Ordinal);
    }
}
