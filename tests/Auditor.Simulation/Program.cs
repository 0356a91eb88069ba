using System.CommandLine;
using System.Diagnostics;
using System.Globalization;
using Auditor.Simulation.Bases;

namespace Auditor.Simulation;

/// <summary>Measures the tests, verdicts and intervals of the audit on simulated data; README.md says how and what came out.</summary>
internal static class Program
{
    private const string BasisResults = "tests/Auditor.Simulation/bases.md";
    private const string EliminationResults = "tests/Auditor.Simulation/elimination.md";
    private const string FewDfResults = "tests/Auditor.Simulation/few-df.md";
    private const string Results = "tests/Auditor.Simulation/results.md";

    public static int Main(string[] args)
    {
        var draws = new Option<int>("--draws") { Description = "Data sets for each cell.", DefaultValueFactory = _ => 2000 };
        var seed = new Option<ulong>("--seed") { Description = "Seed of all random numbers.", DefaultValueFactory = _ => 1 };
        var write = new Option<string?>("--write")
        {
            Description = "Write the tables to a file too, as seen from the root of the repository: " + Results,
            HelpName = "FILE",
            Arity = ArgumentArity.ZeroOrOne,
        };
        var root = new RootCommand("Simulation of the audit's tests, verdicts and intervals.") { draws, seed, write };
        root.SetAction(parsed => Run(parsed.GetValue(draws), parsed.GetValue(seed), parsed.GetResult(write) is null ? null : parsed.GetValue(write) ?? Results));
        var elimination = new Command("elimination", "Groups that a rule of backward elimination left out: plain test and p given the rule.") { draws, seed, write };
        elimination.SetAction(parsed => RunElimination(
            parsed.GetValue(draws), parsed.GetValue(seed), parsed.GetResult(write) is null ? null : parsed.GetValue(write) ?? EliminationResults));
        root.Add(elimination);
        root.Add(BasisCommand(seed, write));
        var few = new Command("few-df", "The negligible-effect test where few degrees of freedom stand behind the covariance.") { draws, seed, write };
        few.SetAction(parsed => RunFewDf(parsed.GetValue(draws), parsed.GetValue(seed), parsed.GetResult(write) is null ? null : parsed.GetValue(write) ?? FewDfResults));
        root.Add(few);
        return root.Parse(args).Invoke();
    }

    private static void Run(int draws, ulong seed, string? file)
    {
        var (clock, policies) = (Stopwatch.StartNew(), Policies.Read());
        var results = new Study(policies, seed, draws, new Percentages()).Run();
        Show(ResultText.Of(results, new RunFacts(draws, seed, DateTimeOffset.UtcNow, clock.Elapsed), policies.Hc3), file);
    }

    private static void RunElimination(int draws, ulong seed, string? file)
    {
        var clock = Stopwatch.StartNew();
        var results = new EliminationStudy(seed, draws, new Percentages()).Run();
        Show(EliminationText.Of(results, new RunFacts(draws, seed, DateTimeOffset.UtcNow, clock.Elapsed)), file);
    }

    private static void RunFewDf(int draws, ulong seed, string? file) =>
        Show(new FewDfStudy(seed, draws).Table(new RunFacts(draws, seed, DateTimeOffset.UtcNow, TimeSpan.Zero)), file);

    private static Command BasisCommand(Option<ulong> seed, Option<string?> write)
    {
        var draws = new Option<int>("--draws") { Description = "Data sets for each cell.", DefaultValueFactory = _ => 1000 };
        var threads = new Option<int>("--threads") { Description = "Results do not depend on it.", DefaultValueFactory = _ => Environment.ProcessorCount };
        var command = new Command("bases", "By which test an exclusion can be judged: clusters, series, panels, families of groups.") { draws, seed, threads, write };
        command.SetAction(parsed => RunBases(
            parsed.GetValue(draws), parsed.GetValue(seed), parsed.GetValue(threads), parsed.GetResult(write) is null ? null : parsed.GetValue(write) ?? BasisResults));
        return command;
    }

    private static void RunBases(int draws, ulong seed, int threads, string? file)
    {
        var (clock, policy) = (Stopwatch.StartNew(), Policies.Read().Hc3);
        var worlds = new Worlds(policy).All;
        var counts = new BasisStudy(seed, draws, threads, new Percentages()).Run(worlds);
        var facts = new RunFacts(draws, seed, DateTimeOffset.UtcNow, clock.Elapsed);
        Show(new BasisText(worlds, counts, facts).Write(policy.Significance, policy.NegligiblePartialRSquared), file);
    }

    private static void Show(string text, string? file)
    {
        Console.Out.Write(text);
        if (file is not null)
        {
            File.WriteAllText(file, text);
        }
    }
}

internal sealed record RunFacts(int Draws, ulong Seed, DateTimeOffset Moment, TimeSpan Took);

/// <summary>Says on standard error how far the run is, each tenth once.</summary>
internal sealed class Percentages : IProgress<double>
{
    private int _tenths;

    public void Report(double value)
    {
        if ((int)(value * 10) > _tenths)
        {
            _tenths = (int)(value * 10);
            Console.Error.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{10 * _tenths} %"));
        }
    }
}
