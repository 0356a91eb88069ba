using System.Text.RegularExpressions;
using Auditor.Numerics;

namespace Auditor.Tests.Architecture;

/// <summary>Who may see whom. Data flow one way; nothing on the right is visible to the left.</summary>
public sealed partial class LayerTests(ITestOutputHelper output)
{
    /// <summary>For each part of the audit, the other parts it may use.</summary>
    private static readonly Dictionary<string, string[]> May = new()
    {
        ["Yaml"] = [],
        ["Data"] = ["Numerics.Storage"],
        ["Findings"] = [],
        ["Results"] = [],
        ["Policies"] = ["Yaml"],
        ["Declaration"] = ["Data", "Yaml"],
        ["Design"] = ["Data", "Declaration", "Numerics", "Yaml"],
        ["Rows"] = ["Data", "Design", "Numerics", "Results"],
        ["Analysis"] = ["Data", "Declaration", "Design", "Numerics", "Policies", "Results", "Rows"],
        ["Facts"] = ["Data", "Declaration", "Design", "Findings", "Policies", "Results"],
        ["Rules"] = ["Facts", "Findings", "Policies", "Yaml"],
        ["Acceptances"] = ["Facts", "Findings", "Rules", "Yaml"],
        ["Reporting"] = ["Findings", "Results"],
    };

    /// <summary>Parts that stand beside the audit and may use all of it.</summary>
    private static readonly string[] Users = ["SelfTest", "Starting"];

    [Fact]
    public void Every_part_uses_only_what_stands_before_it()
    {
        var files = SourceFile.Under("Auditor").Where(file => file.Path.Split('/').Length > 2).ToList();
        var wrong = files.SelectMany(Misuses).ToList();
        output.WriteLine($"{files.Count} files looked at");
        Assert.True(files.Count > 150, $"only {files.Count} files found");
        Assert.Empty(wrong);
    }

    [Fact]
    public void Every_folder_is_a_known_part()
    {
        var folders = Directory.GetDirectories(Path.Combine(TestFolders.Root, "src", "Auditor")).Select(folder => Path.GetFileName(folder)!)
            .Except(["bin", "obj"]).ToList();
        output.WriteLine($"{folders.Count} folders looked at");
        Assert.Equal(May.Keys.Order(StringComparer.Ordinal), folders.Except(Users).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void Numerics_and_the_audit_know_no_outer_layer()
    {
        Assert.DoesNotContain(References(typeof(Fit)), name => name.StartsWith("Auditor", StringComparison.Ordinal));
        Assert.DoesNotContain(References(typeof(Audit)), name => name == "Auditor.Cli");
        Assert.All(References(typeof(Fit)), name => Assert.True(name.StartsWith("System", StringComparison.Ordinal) || name == "MathNet.Numerics", name));
    }

    /// <summary>The pure parts read no file, no clock, no environment and write to no terminal.</summary>
    [Fact]
    public void Only_the_command_line_does_input_and_output()
    {
        var files = SourceFile.Under("Auditor").Concat(SourceFile.Under("Auditor.Numerics")).ToList();
        var found = from file in files
                    from line in file.Code
                    where Outside().IsMatch(line.Code)
                    select $"{file.Path}:{line.Line}: {line.Code.Trim()}";
        output.WriteLine($"{files.Count} files looked at");
        Assert.True(files.Count > 200, $"only {files.Count} files found");
        Assert.Empty(found);
    }

    [Fact]
    public void Classes_are_sealed_unless_they_are_meant_to_be_derived_from()
    {
        Type[] types = [.. new[] { typeof(Fit), typeof(Audit) }.SelectMany(type => type.Assembly.GetTypes()).Where(IsOwnClass)];
        output.WriteLine($"{types.Length} classes looked at");
        Assert.True(types.Length > 250, $"only {types.Length} classes found");
        Assert.Empty(types.Where(type => !type.IsSealed && !type.IsAbstract && !types.Any(other => other.BaseType == type)).Select(type => type.FullName));
    }

    private static bool IsOwnClass(Type type) =>
        type.IsClass && type.Namespace?.StartsWith("Auditor", StringComparison.Ordinal) == true && !type.Name.Contains('<', StringComparison.Ordinal);

    private static IEnumerable<string> Misuses(SourceFile file)
    {
        var part = file.Path.Split('/')[1];
        return !May.TryGetValue(part, out var allowed) ? []
            : from line in file.Code
              from Match use in Use().Matches(line.Code)
              let used = use.Groups["part"].Value
              where used != part && (May.ContainsKey(used) || used.StartsWith("Numerics", StringComparison.Ordinal)) && !allowed.Contains(used) && !allowed.Contains(used.Split('.')[0])
              select $"{file.Path}:{line.Line}: {part} may not use {used}";
    }

    private static IEnumerable<string> References(Type type) => type.Assembly.GetReferencedAssemblies().Select(name => name.Name!);

    [GeneratedRegex(@"Auditor\.(?<part>Numerics\.Storage|[A-Z][A-Za-z]*)")]
    private static partial Regex Use();

    [GeneratedRegex(@"\b(File|Directory|FileInfo|DirectoryInfo|Console|Environment|DateTime|DateTimeOffset|Stopwatch|Process)\.[A-Z]|new (FileStream|StreamWriter|FileInfo)\(")]
    private static partial Regex Outside();
}
