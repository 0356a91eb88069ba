using System.Security.Cryptography;
using System.Text.RegularExpressions;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>No file of tests/reference is carried for nothing, and its documents say what the tests rely on.</summary>
public sealed class CarriedFilesTests
{
    /// <summary>Files that another test project opens, and the test that does.</summary>
    private static readonly Dictionary<string, string> OpenedElsewhere = new()
    {
        ["tables.json"] = "tests/Auditor.Numerics.Tests/Distributions/CriticalValueTableTests.cs",
    };

    [Theory]
    [MemberData(nameof(Runs.Declarations), MemberType = typeof(Runs))]
    public void The_audit_read_the_data_of_its_case(string name, string variant) => AssertDataWereRead(CaseRuns.Of(name, variant));

    [Fact]
    public void Sources_name_every_case() => AssertNamesEveryCase("SOURCES.md", name => $"| {name} |");

    [Fact]
    public void The_script_that_made_the_values_makes_every_case() => AssertNamesEveryCase("make_gold.R", name => $"\"{name}\"");

    [Fact]
    public void The_tolerances_are_those_of_the_agreement_of_two_routes()
    {
        string agreement = ReferenceFiles.ReadText("AGREEMENT.md");
        foreach (ReferenceCase one in ReferenceCases.All)
        {
            Match line = Regex.Match(agreement, $@"^\| {one.Name} \|.*\| (?<tolerance>[0-9e-]+) \|$", RegexOptions.Multiline);
            Assert.True(line.Success, one.Name);
            Assert.Equal(one.Tolerance, Quantity.Parse(line.Groups["tolerance"].Value).Number, 1e-12);
        }
    }

    [Theory]
    [InlineData("overall_F")]
    [InlineData("group_tests_within_largest_model")]
    [InlineData("robust_wald")]
    [InlineData("noncentrality")]
    [InlineData("adjusted_p_values")]
    [InlineData("columns_dropped_as_aliased")]
    public void Fields_that_are_compared_are_explained(string field) => Assert.Contains(field, ReferenceFiles.ReadText("FIELDS.md"), StringComparison.Ordinal);

    [Theory]
    [InlineData("second_route.py", "exact.json")]
    [InlineData("make_declarations.py", "declaration-largest-powers.yaml")]
    public void Scripts_say_what_they_write(string script, string file) => Assert.Contains(file, ReferenceFiles.ReadText(script), StringComparison.Ordinal);

    [Fact]
    public void Every_carried_file_is_opened()
    {
        foreach (ReferenceCase one in ReferenceCases.All)
        {
            Assert.All(one.Variants(), variant => AssertDataWereRead(CaseRuns.Of(one.Name, variant)));
        }

        FloorFile.Read();
        SelfTestPlan.Read(ReferenceFiles.ReadText);
        Sources_name_every_case();
        The_script_that_made_the_values_makes_every_case();
        The_tolerances_are_those_of_the_agreement_of_two_routes();
        Fields_that_are_compared_are_explained("overall_F");
        Scripts_say_what_they_write("second_route.py", "exact.json");
        Scripts_say_what_they_write("make_declarations.py", "declaration-largest-powers.yaml");
        Assert.True(ReferenceFiles.Carried.Count >= 130, $"only {ReferenceFiles.Carried.Count} files found");
        Assert.Empty(ReferenceFiles.Carried.Except(ReferenceFiles.Opened).Except(OpenedElsewhere.Keys));
        Assert.All(OpenedElsewhere, file => Assert.Contains(file.Key, File.ReadAllText(Path.Combine(TestFolders.Root, file.Value)), StringComparison.Ordinal));
    }

    [Fact]
    public void Every_worked_case_has_a_test_that_names_it()
    {
        string tests = string.Concat(Directory.EnumerateFiles(Path.Combine(TestFolders.Root, "tests"), "*.cs", SearchOption.AllDirectories).Select(File.ReadAllText));
        IReadOnlyList<string> cases = [.. Directory.EnumerateFiles(TestFolders.Vectors, "*.json").Select(path => Path.GetFileNameWithoutExtension(path))];
        Assert.NotEmpty(cases);
        Assert.All(cases, name => Assert.True(Names(tests, $"\"{name}\"") || Names(tests, $"{name}.json\""), name + " is opened by no test"));
    }

    private static bool Names(string tests, string literal) => tests.Contains(literal, StringComparison.Ordinal);

    /// <summary>The record's fingerprint of the data is that of the case's own file, so the audit did read it.</summary>
    private static void AssertDataWereRead(CaseRun run)
    {
        byte[] data = File.ReadAllBytes(ReferenceFiles.FullPath(run.Case.Name + "/data.csv"));
        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(data)), run.Record.Root.GetProperty("provenance").Text("data_sha256"));
    }

    private static void AssertNamesEveryCase(string file, Func<string, string> mention)
    {
        string text = ReferenceFiles.ReadText(file);
        Assert.All(ReferenceCases.All, one => Assert.Contains(mention(one.Name), text, StringComparison.Ordinal));
    }
}
