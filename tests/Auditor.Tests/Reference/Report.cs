using Auditor.SelfTest;

namespace Auditor.Tests.Reference;

/// <summary>Turns figures that do not hold into one message.</summary>
internal static class Report
{
    public static void AssertAllHold(IReadOnlyCollection<Figure> figures, double relativeTolerance)
    {
        Assert.NotEmpty(figures);
        IReadOnlyList<Figure> failed = [.. figures.Where(figure => !figure.Holds(relativeTolerance))];
        Assert.True(failed.Count == 0, $"{failed.Count} of {figures.Count} outside {relativeTolerance}:\n" + string.Join('\n', failed.Select(figure => figure.Describe())));
    }
}
