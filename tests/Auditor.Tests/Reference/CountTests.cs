using System.Globalization;

namespace Auditor.Tests.Reference;

/// <summary>A suite that compares nothing is green too: how many cases and numbers were compared is itself asserted.</summary>
public sealed class CountTests(ITestOutputHelper output)
{
    [Fact]
    public void Enough_cases_and_numbers_are_compared()
    {
        IReadOnlyList<CaseRun> runs = [.. ReferenceCase.All.SelectMany(one => one.Variants.Select(variant => CaseRun.Of(one.Name, variant)))];
        int numbers = runs.Sum(run => Runs.Figures(run).Count + VarianceInflationFigures.Of(run).Count());
        int exact = runs.Sum(run => Runs.Figures(run).Count(figure => figure.Exact is not null));
        output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{ReferenceCase.All.Count()} cases, {runs.Count} declarations, {numbers} numbers, {exact} of them against 100 digits or certified values"));
        Assert.Equal(23, ReferenceCase.All.Count());
        Assert.Equal(56, runs.Count);
        Assert.True(numbers >= 5800, "too few numbers");
        Assert.True(exact >= 2330, "too few exact numbers");
    }
}
