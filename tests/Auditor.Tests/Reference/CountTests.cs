using System.Globalization;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>A suite that compares nothing is green too: how many cases and numbers were compared is itself asserted.</summary>
public sealed class CountTests(ITestOutputHelper output)
{
    [Fact]
    public void Enough_cases_and_numbers_are_compared()
    {
        IReadOnlyList<CaseRun> runs = [.. ReferenceCases.All.SelectMany(one => one.Variants().Select(variant => CaseRuns.Of(one.Name, variant)))];
        int numbers = runs.Sum(run => run.Figures().Count + VarianceInflationFigures.Of(run).Count());
        int exact = runs.Sum(run => run.Figures().Count(figure => figure.Exact is not null));
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{ReferenceCases.All.Count()} cases, {runs.Count} declarations, {numbers} numbers, {exact} of them against 100 digits or certified values"));
        Assert.Equal(23, ReferenceCases.All.Count());
        Assert.Equal(56, runs.Count);
        Assert.True(numbers >= 7500, "too few numbers");
        Assert.True(exact >= 2900, "too few exact numbers");
    }
}
