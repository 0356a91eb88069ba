using Auditor.SelfTest;
using Auditor.Tests.Reference;

namespace Auditor.Tests.SelfTest;

/// <summary>Floors of the distributions that the self-test ships, kept and raised like those of the audits.</summary>
public sealed class DistributionFloorTests
{
    public static TheoryData<string> Files => [.. SelfTestPlan.Read(ReferenceFiles.ReadText).Distributions];

    [Theory]
    [MemberData(nameof(Files))]
    public void Correct_digits_are_at_least_the_floor(string file)
    {
        string key = FloorTable.Distribution(file);
        var measured = DistributionValues.Worst(file, ShippedCases.Text($"distributions/{file}.csv")).ToDictionary(figure => figure.Kind, figure => figure.CorrectDigits);
        if (FloorFile.Raising)
        {
            FloorFile.Raise(key, measured);
        }

        SortedDictionary<string, int> floors = FloorFile.Read()[key];
        Assert.Equal(floors.Keys, measured.Keys.Order(StringComparer.Ordinal));
        Assert.All(measured, kind => Assert.True(kind.Value >= floors[kind.Key] && floors[kind.Key] >= 10, $"{kind.Key}: {kind.Value} digits, floor {floors[kind.Key]}"));
    }
}
