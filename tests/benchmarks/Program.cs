using System.CommandLine;
using BenchmarkDotNet.Running;

namespace Auditor.Benchmarks;

/// <summary>Makes data, and measures reading and whole audits; README.md says how, results.md what came out.</summary>
internal static class Program
{
    public static int Main(string[] args)
    {
        var root = new RootCommand("Benchmarks of reading and of whole audits.") { Generate(), Read(), Whole() };
        var kernels = new Command("kernels", "BenchmarkDotNet, for example: kernels --filter '*Reading*'") { TreatUnmatchedTokensAsErrors = false };
        kernels.SetAction(parsed => { BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run([.. parsed.UnmatchedTokens]); });
        root.Subcommands.Add(kernels);
        return root.Parse(args).Invoke();
    }

    private static Command Generate()
    {
        var rows = Number("--rows", "Rows n.", 1_000_000);
        var columns = Number("--columns", "Columns p, the response included.", 30);
        var final = Number("--final", "Numbers in the final model.", 9);
        var groups = Number("--groups", "Left-out groups.", 20);
        var seed = Number("--seed", "Seed.", 1);
        var missing = new Option<double>("--missing") { Description = "Share of empty cells in left-out columns." };
        var gzip = new Option<bool>("--gzip") { Description = "Compressed." };
        var folder = Folder();
        var name = new Option<string>("--name") { Description = "Name of data and declaration.", DefaultValueFactory = _ => "numbers" };
        var command = new Command("generate", "Writes NAME.csv and NAME.yaml.") { rows, columns, final, groups, seed, missing, gzip, folder, name };
        command.SetAction(parsed =>
        {
            var data = new DataSet(
                parsed.GetValue(rows), parsed.GetValue(columns), parsed.GetValue(final), parsed.GetValue(groups), parsed.GetValue(missing), (ulong)parsed.GetValue(seed));
            var path = data.Write(parsed.GetValue(folder)!, parsed.GetValue(name)!, parsed.GetValue(gzip));
            Console.Out.WriteLine($"{path}: {new FileInfo(path).Length / 1e6:0.0} MB");
        });
        return command;
    }

    private static Command Read()
    {
        var (data, runs) = (new Argument<string>("DATA.csv"), Number("--runs", "Runs, their median is shown.", 5));
        var command = new Command("read", "The tool's reader against an embedded column store's scan of the same file.") { data, runs };
        command.SetAction(parsed => ReadingTimes.Print(parsed.GetValue(data)!, parsed.GetValue(runs)));
        return command;
    }

    private static Command Whole()
    {
        var declaration = new Argument<string>("DECLARATION.yaml");
        var program = new Option<string>("--program") { Description = "The program as run-audit.sh built it (.build/app-…/Auditor.Cli), or Auditor.Cli.dll as published.", Required = true };
        var runs = Number("--runs", "Runs, their median is shown.", 5);
        var command = new Command("whole", "Whole audits by the published program, record only.") { declaration, program, runs };
        command.SetAction(parsed => WholeTimes.Print(parsed.GetValue(declaration)!, parsed.GetValue(program)!, parsed.GetValue(runs)));
        return command;
    }

    private static Option<int> Number(string name, string description, int usual) => new(name) { Description = description, DefaultValueFactory = _ => usual };

    private static Option<string> Folder() => new("--out") { Description = "Folder.", DefaultValueFactory = _ => "." };
}
