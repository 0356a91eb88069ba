using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

/// <summary>The declarations carried with the reference cases, written by a script that knows the cases and not this reader.</summary>
public sealed class ReferenceDeclarationTests
{
    [Fact]
    public void Every_one_is_read_without_a_problem()
    {
        var files = Directory.GetFiles(TestFolders.Reference, "declaration*.yaml", SearchOption.AllDirectories);

        Assert.InRange(files.Length, 46, int.MaxValue);
        Assert.All(files, file =>
        {
            var reading = DeclarationReader.Read(File.ReadAllText(file), Path.GetFileName(file));
            Assert.Equal([], reading.Problems.Select(problem => problem.ToString()));
            var folder = Path.GetFileName(Path.GetDirectoryName(file)!).Replace('_', '-');
            Assert.StartsWith(folder, reading.Declaration!.Model.Id, StringComparison.Ordinal);
        });
    }
}
