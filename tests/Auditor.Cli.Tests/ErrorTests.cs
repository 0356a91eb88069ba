using System.Globalization;
using System.Text;

namespace Auditor.Cli.Tests;

/// <summary>Every wrong use ends with 2, says all that is wrong on standard error and writes nothing.</summary>
public sealed class ErrorTests
{
    [Fact]
    public void Every_message_is_the_kept_one()
    {
        var texts = new string[ErrorCases.All.Count];
        Parallel.For(0, texts.Length, new ParallelOptions { MaxDegreeOfParallelism = 2 }, at => texts[at] = Told(ErrorCases.All[at]));

        Assert.True(texts.Length >= 20, string.Create(CultureInfo.InvariantCulture, $"{texts.Length} cases"));
        Golden.Matches(string.Join('\n', texts), "errors.txt");
    }

    [Fact]
    public void Data_outside_are_read_when_the_command_line_allows_their_folder()
    {
        using var folder = Leases.Folder()
            .With("models/lease.yaml", Leases.Declaration.Replace("leases.csv", "../shared/leases.csv", StringComparison.Ordinal))
            .With("shared/leases.csv", Leases.Csv());
        File.CreateSymbolicLink(folder.At("models/leases.csv"), folder.At("shared/leases.csv"));

        ProgramRun.In(folder, "models/lease.yaml", "--data-root", "shared").Ends(0);
        ProgramRun.In(folder, "models/lease.yaml", "--data-root", "shared/..").Ends(0);
        ProgramRun.In(folder, "models/lease.yaml", "--data-root", "models").Ends(2);
        folder.With("models/lease.yaml", Leases.Declaration);
        ProgramRun.In(folder, "models/lease.yaml", "--data-root", "shared").Ends(0);
    }

    [Fact]
    public void A_link_that_stays_inside_is_followed()
    {
        using var folder = Leases.Folder(Leases.Declaration.Replace("leases.csv", "today.csv", StringComparison.Ordinal));
        File.CreateSymbolicLink(folder.At("today.csv"), "leases.csv");
        Directory.CreateSymbolicLink(folder.At("by-another-way"), folder.Root);

        ProgramRun.In(folder, "lease.yaml").Ends(0);
        ProgramRun.In(folder, "by-another-way/lease.yaml").Ends(0);
    }

    private static string Told(ErrorCase wrong)
    {
        using var folder = Leases.Folder();
        wrong.Arrange(folder);
        var before = folder.Files();
        var run = ProgramRun.In(folder, wrong.Arguments).Ends(2);

        Assert.Equal("", run.Output);
        Assert.NotEqual("", run.Errors);
        Assert.Equal(before, folder.Files());
        var text = new StringBuilder("## ").Append(wrong.Title).Append("\n> run-audit.sh");
        foreach (var argument in wrong.Arguments)
        {
            text.Append(' ').Append(argument.Length > 0 ? argument : "\"\"");
        }

        return text.Append('\n').Append(run.Errors.Replace(folder.Root, "FOLDER", StringComparison.Ordinal)).ToString();
    }
}
