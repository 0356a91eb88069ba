using System.Globalization;
using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Correct digits of every kind of figure against the best value known: 100-digit arithmetic where exact.json holds it, else case.json.</summary>
public sealed class FloorTests(ITestOutputHelper output)
{
    [Theory]
    [MemberData(nameof(Runs.Declarations), MemberType = typeof(Runs))]
    public void Correct_digits_are_at_least_the_floor(string name, string variant)
    {
        string key = FloorFile.Key(name, variant);
        IReadOnlyDictionary<string, double> measured = Measured(CaseRuns.Of(name, variant));
        if (FloorFile.Raising)
        {
            FloorFile.Raise(key, measured);
        }

        SortedDictionary<string, int> floors = FloorFile.Read()[key];
        Assert.Equal(floors.Keys, measured.Keys.Order(StringComparer.Ordinal));
        Assert.All(measured, kind => Check(kind.Key, kind.Value, floors[kind.Key]));
    }

    /// <summary>The fewest correct digits of each kind of figure.</summary>
    private static Dictionary<string, double> Measured(CaseRun run) => run.Figures()
        .Where(figure => !figure.MustBeAbsent)
        .GroupBy(figure => figure.Kind)
        .ToDictionary(kind => kind.Key, kind => kind.Min(figure => figure.CorrectDigits));

    private void Check(string kind, double digits, int floor)
    {
        string line = string.Create(CultureInfo.InvariantCulture, $"{kind}: {digits:F1} digits, floor {floor}");
        output.WriteLine(line);
        Assert.True(digits >= floor, line);
    }
}
