using System.Text.Json;

namespace Auditor.Cli.Tests;

public sealed class NewTests
{
    [Fact]
    public void A_first_declaration_is_written_here_and_audited_without_edits()
    {
        using var folder = new TemporaryFolder().With("leases.csv", Leases.Csv());
        var run = ProgramRun.In(folder, "new", "leases.csv", "--response", "loss").Ends(0);

        Assert.Equal("Written: leases.yaml\nAudit it with: ./run-audit.sh leases.yaml\n", run.Output);
        Assert.Equal(["leases.csv", "leases.yaml"], folder.Files());
        ProgramRun.In(folder, "leases.yaml").Ends(0);
        using var record = JsonDocument.Parse(folder.Text("audit-out/leases.json"));
        Assert.Equal(
            ["price", "region", "engine_hours", "age"],
            record.RootElement.GetProperty("model").GetProperty("terms").EnumerateArray().Select(term => term.GetString()));
    }

    [Fact]
    public void The_declared_hash_is_that_of_the_file()
    {
        using var folder = Leases.Folder();
        ProgramRun.In(folder, "new", "leases.csv", "--response", "loss").Ends(0);
        var text = folder.Text("leases.yaml");
        folder.With("leases.yaml", text.Replace("# sha256:", "sha256:", StringComparison.Ordinal));

        ProgramRun.In(folder, "leases.yaml").Ends(0);
        folder.With("leases.csv", Leases.Csv(rows: 121));
        Assert.Contains("is another file than data.sha256 says", ProgramRun.In(folder, "leases.yaml").Ends(2).Errors, StringComparison.Ordinal);
    }

    /// <summary>run-audit.sh says how it was called: the line works in the folder where the command was typed.</summary>
    [Fact]
    public void The_last_line_calls_the_script_as_it_was_called_and_the_file_as_it_was_named()
    {
        using var folder = new TemporaryFolder().With("leases.csv", Leases.Csv());
        var target = folder.At("the first's.yaml");
        var run = ProgramRun.With(folder, [("AUDITOR_CALLED_AS", "../tools/run-audit.sh")], "new", "leases.csv", "--response", "loss", "--out", target).Ends(0);

        Assert.Equal($"Written: {target}\nAudit it with: ../tools/run-audit.sh '{folder.At("the first")}'\\''s.yaml'\n", run.Output);
        Assert.Contains("\nexport AUDITOR_CALLED_AS=\"$script\"\n", Repository.Text("run-audit.sh"), StringComparison.Ordinal);
    }

    [Fact]
    public void Nothing_is_written_over()
    {
        using var folder = new TemporaryFolder().With("leases.csv", Leases.Csv()).With("leases.yaml", "of someone else");
        var run = ProgramRun.In(folder, "new", "leases.csv", "--response", "loss").Ends(2);

        Assert.Equal("leases.yaml: it is there already and is not written over; name another file with --out FILE\n", run.Errors);
        Assert.Equal("of someone else", folder.Text("leases.yaml"));
    }

    [Fact]
    public void Data_elsewhere_are_named_relative_to_the_declaration()
    {
        using var folder = new TemporaryFolder().With("store/leases 2025.csv", Leases.Csv()).WithFolder("models");
        var run = ProgramRun.In(folder, "new", "store/leases 2025.csv", "--response", "loss", "--out", "models/own.yaml").Ends(0);

        Assert.Contains("id: leases-2025 ", folder.Text("models/own.yaml"), StringComparison.Ordinal);
        Assert.Contains("source: \"../store/leases 2025.csv\" ", folder.Text("models/own.yaml"), StringComparison.Ordinal);
        Assert.EndsWith($"Audit it with: ./run-audit.sh models/own.yaml --data-root {folder.At("store")}\n", run.Output, StringComparison.Ordinal);
        ProgramRun.In(folder, "models/own.yaml").Ends(2);
        ProgramRun.In(folder, "models/own.yaml", "--data-root", folder.At("store")).Ends(0);
    }
}
