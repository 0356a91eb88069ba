using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>The key <c>elimination.steps</c>: declared groups in the order they were dropped, each at most once.</summary>
internal static class EliminationStepsReader
{
    public static IReadOnlyList<EliminationStep> Read(Place place, IReadOnlyList<LeftOutGroup> groups)
    {
        var first = new Dictionary<string, int>(StringComparer.Ordinal);
        var names = groups.Select(group => group.Name).ToHashSet(StringComparer.Ordinal);
        return [.. (place.Items("steps") ?? []).Select(item => Step(item, names, first)).OfType<EliminationStep>()];
    }

    private static EliminationStep? Step(Place place, HashSet<string> groups, Dictionary<string, int> first)
    {
        if (Keys.Of(place, "drop", "reported") is not { } keys)
        {
            return null;
        }

        var dropped = keys.Required("drop", "the name of a left-out group");
        var name = dropped?.Text("the name of a left-out group");
        var reported = keys.Optional("reported") is { } printed ? ReportedReader.Test(printed) : null;
        if (dropped is null || name is null)
        {
            return null;
        }

        if (!groups.Contains(name))
        {
            dropped.Add($"no left-out group is called '{Words.Short(name)}'{NearestName.Hint(name, groups)}");
        }
        else if (!first.TryAdd(name, dropped.Line))
        {
            dropped.Add(Distinct.Twice("group", name, first[name]));
        }

        return new EliminationStep(name, reported, place.Line);
    }
}
