namespace Auditor.Cli.Tests;

/// <summary>What the README shows works as it says.</summary>
public sealed class ReadmeTests
{
    private static readonly ReadmeFile Readme = ReadmeFile.Read(Repository.Text("README.md").ReplaceLineEndings("\n"));

    [Fact]
    public void Its_commands_run_on_its_example()
    {
        using var folder = new TemporaryFolder();
        foreach (var (name, text) in Readme.Files)
        {
            folder.With(name, text);
        }

        var run = Readme.Commands.Where(command => ReadmeFile.Arguments(command) is not null).ToList();
        Assert.Equal(["accepted.yaml", "leases.csv", "leases.yaml"], folder.Files());
        Assert.Contains("./run-audit.sh demo", run);
        Assert.Contains("./run-audit.sh leases.yaml", run);
        Assert.Contains("./run-audit.sh leases.yaml --acceptances accepted.yaml --as-of 2026-06-30", run);
        Assert.All(run, command => ProgramRun.In(folder, ReadmeFile.Arguments(command)!).Ends(Status(command)));
        Assert.Contains(Path.Combine("audit-out", "lease-loss.html"), folder.Files());
        Assert.Contains(Path.Combine("audit-out", "tractor-resale-shortfall.json"), folder.Files());
    }

    [Fact]
    public void Its_acceptance_holds()
    {
        using var folder = new TemporaryFolder();
        foreach (var (name, text) in Readme.Files)
        {
            folder.With(name, text);
        }

        var accepted = ProgramRun.In(folder, "leases.yaml", "--acceptances", "accepted.yaml", "--as-of", "2026-06-30").Ends(0);
        Assert.Contains("; 1 finding accepted as of ", accepted.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("acceptance-", folder.Text(Path.Combine("audit-out", "lease-loss.json")), StringComparison.Ordinal);
    }

    [Fact]
    public void The_examples_of_a_readme_are_found()
    {
        var readme = ReadmeFile.Read(
            """
            See `other.csv`, or run `./run-audit.sh rules` and
            `./run-audit.sh rules
            ID`. Then `a.csv`:

            ```csv
            x,y
            1,2
            ```

            ```yaml
            # a.yaml
            audit: 1
            ```

            ```yaml
            left_out: []
            ```

            ```sh
            ./run-audit.sh a.yaml --quiet   # no words
            dotnet test Auditor.sln
            ./run-audit.sh DECLARATION.yaml
            ```
            """);

        Assert.Equal([("a.yaml", "# a.yaml\naudit: 1\n"), ("a.csv", "x,y\n1,2\n")], readme.Files);
        Assert.Equal(["./run-audit.sh a.yaml --quiet   # no words", "./run-audit.sh DECLARATION.yaml", "./run-audit.sh rules", "./run-audit.sh rules ID"], readme.Commands);
        Assert.Equal(["a.yaml", "--quiet"], ReadmeFile.Arguments(readme.Commands[0])!);
        Assert.Null(ReadmeFile.Arguments("./run-audit.sh rules ID"));
        Assert.Null(ReadmeFile.Arguments("./run-audit.sh --policy FILE"));
    }

    /// <summary>The demo has an exclusion that the data contradict, as the README says of it.</summary>
    private static int Status(string command) => command.StartsWith("./run-audit.sh demo", StringComparison.Ordinal) ? 1 : 0;
}
