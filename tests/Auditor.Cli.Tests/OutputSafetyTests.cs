namespace Auditor.Cli.Tests;

/// <summary>A run that cannot finish leaves no half of an output, and the outputs of an earlier run as they were.</summary>
public sealed class OutputSafetyTests
{
    private const string Html = "out/lease-loss.html";
    private const string Json = "out/lease-loss.json";

    [Theory]
    [InlineData(Html, Json)]
    [InlineData(Json, Html)]
    public void A_folder_where_a_file_should_go_leaves_the_other_file_as_it_was(string folderName, string other)
    {
        using var folder = Leases.Folder().WithFolder(folderName).With(other, "an earlier run");
        var run = ProgramRun.In(folder, "lease.yaml", "--out", "out").Ends(2);

        Assert.Equal($"out: the outputs cannot be written here: '{Path.GetFileName(folderName)}' is a folder there\n", run.Errors);
        Assert.Equal("", run.Output);
        Assert.Equal(["lease.yaml", "leases.csv", other], folder.Files());
        Assert.Equal("an earlier run", folder.Text(other));
    }

    [Fact]
    public void Earlier_outputs_are_replaced_and_nothing_else_is_left()
    {
        using var folder = Leases.Folder().With(Html, "an earlier run").With(Json, "an earlier run");
        ProgramRun.In(folder, "lease.yaml", "--out", "out").Ends(0);

        Assert.Equal(["lease.yaml", "leases.csv", Html, Json], folder.Files());
        Assert.StartsWith("{", folder.Text(Json), StringComparison.Ordinal);
        Assert.Contains("<html", folder.Text(Html), StringComparison.Ordinal);
    }

    [Fact]
    public void A_file_where_the_folder_should_be_is_a_problem()
    {
        using var folder = Leases.Folder().With("out", "a file");
        var run = ProgramRun.In(folder, "lease.yaml", "--out", "out/below").Ends(2);

        Assert.StartsWith("out/below: the outputs cannot be written here: ", run.Errors, StringComparison.Ordinal);
        Assert.Equal(["lease.yaml", "leases.csv", "out"], folder.Files());
    }

    /// <summary>Below /proc nothing can be made, not even by the system's administrator, to whom permissions of a folder mean nothing.</summary>
    [Fact]
    public void A_folder_that_takes_no_files_is_a_problem()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "needs Linux's /proc");
        using var folder = Leases.Folder();
        var run = ProgramRun.In(folder, "lease.yaml", "--out", "/proc/self").Ends(2);

        Assert.StartsWith("/proc/self: the outputs cannot be written here: ", run.Errors, StringComparison.Ordinal);
        Assert.Equal(["lease.yaml", "leases.csv"], folder.Files());
    }

    [Fact]
    public void Unusable_input_leaves_earlier_outputs_alone()
    {
        using var folder = Leases.Folder(Leases.Declaration + "\nsurprise: 1\n").With(Html, "an earlier run").With(Json, "an earlier run");
        ProgramRun.In(folder, "lease.yaml", "--out", "out").Ends(2);

        Assert.Equal(("an earlier run", "an earlier run"), (folder.Text(Html), folder.Text(Json)));
        Assert.Equal(["lease.yaml", "leases.csv", Html, Json], folder.Files());
    }

    [Fact]
    public void A_fault_of_the_tool_itself_ends_with_3_and_writes_nothing()
    {
        using var program = Installed();
        File.Delete(program.At("templates/report/page.html"));
        using var folder = Leases.Folder();
        var run = ProgramRun.Of(program.At("Auditor.Cli.dll"), folder.Root, null, "lease.yaml").Ends(3);

        Assert.Equal("", run.Output);
        Assert.StartsWith("fatal A fault of the tool itself. Nothing was written.", run.Errors, StringComparison.Ordinal);
        Assert.Equal(["lease.yaml", "leases.csv"], folder.Files());
    }

    /// <summary>A copy of the program that a test may damage.</summary>
    private static TemporaryFolder Installed()
    {
        var copy = new TemporaryFolder();
        var files = Directory.GetFiles(ProgramRun.Folder, "*", SearchOption.AllDirectories)
            .Where(file => !Path.GetFileName(file).StartsWith("xunit", StringComparison.Ordinal));
        foreach (var file in files)
        {
            copy.With(Path.GetRelativePath(ProgramRun.Folder, file), File.ReadAllBytes(file));
        }

        return copy;
    }
}
