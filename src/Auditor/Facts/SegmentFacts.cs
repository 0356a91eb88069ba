using Auditor.Results;

namespace Auditor.Facts;

/// <summary>
/// The facts of left-out groups in parts of the rows: of each division once, whether it could be made; of each group and part its test there; of each group and division the
/// test that the effect is the same in all parts.
/// </summary>
public static class SegmentFacts
{
    private const string Division = "division";
    private const string Part = "part";
    private const string Difference = "difference";
    private const string OfDivision = "it speaks of a division of the rows, not of a group";
    private const string NotOfPart = "it speaks of all parts, not of one";

    private static readonly FactFamily<PartView> Family = new FactFamily<PartView>(About.Segment)
        .Word("kind", "What it speaks of: a division of the rows, a group's test in one part, or a group's difference between the parts.", [Division, Part, Difference], view => view.Kind)
        .Text("by", "What divides the rows.", view => view.By.By)
        .Word("divides", "How: by a segment column, at the declared split, in halves of the time span.", [Divisions.Segment, Divisions.Split, Divisions.Halves], view => view.By.Kind)
        .Count("parts", "parts", "Parts that the rows are divided into.", view => view.By.Parts.Count)
        .Flag("computed", "The division was made, or the test has a p and could reject.", view => view.Kind == Division ? view.By.Why is null : view.PAdjusted is not null)
        .Text("why_not", "Why not.", view => view.Why, _ => "it was computed")
        .Text("group", "Name of the left-out group.", view => view.Exclusion?.Group, _ => OfDivision)
        .Word("group_verdict", "The group's verdict on all its rows.", FactWords.Verdicts, view => view.Exclusion?.Verdict, _ => OfDivision)
        .Flag("group_p_stands", "No product outside the group holds one of its terms and no unit root of the residual is left: a verdict may be drawn from the group's p.", view => view.Stands, _ => OfDivision)
        .Text("part", "The part.", view => view.In?.Part, _ => NotOfPart)
        .Count("rows", FactUnits.Rows, "Rows of the group's test in the part.", view => view.In?.Rows, _ => NotOfPart)
        .Count("parts_compared", "parts", "Parts in which the group could be estimated and compared.", view => view.Kind == Difference ? view.Compared?.PartsCompared : null, _ => "it speaks of no difference")
        .Word("basis", "The test on which p rests.", FactWords.Bases, view => view.Basis, view => view.WhyNone)
        .Number("p", FactUnits.P, "p in the part, or of the difference.", view => view.Test?.P, view => view.WhyNone)
        .Number("p_adjusted", FactUnits.P, "p adjusted for all groups and parts of the division, or for the differences of all groups.", view => view.PAdjusted, view => view.WhyNone)
        .Number("partial_r_squared", FactUnits.PartialRSquared, "Estimated partial R² of the group in the part.", view => view.In?.PartialRSquared.Estimate, view => view.In is null ? NotOfPart : view.WhyNone);

    public static IReadOnlyList<FactDefinition> Definitions => Family.Definitions;

    /// <param name="exclusions">All groups, divided alike.</param>
    /// <param name="stands">Whether a verdict may be drawn from each group's p.</param>
    public static IEnumerable<FactSet> From(IReadOnlyList<Exclusion> exclusions, IReadOnlyList<bool> stands) =>
        exclusions.Take(1).SelectMany(first => first.InParts).Select(division => Family.From(new PartView(Division, division), division.By, null))
            .Concat(exclusions.Zip(stands).SelectMany(group => group.First.InParts.SelectMany(division => OfGroup(group.First, group.Second, division))));

    private static IEnumerable<FactSet> OfGroup(Exclusion exclusion, bool stands, GroupInParts division)
    {
        if (division.Why is not null)
        {
            yield break;
        }

        foreach (var part in division.Parts)
        {
            var view = new PartView(Part, division) { Exclusion = exclusion, Stands = stands, In = part, Basis = part.Basis, Test = part.Test, PAdjusted = part.PAdjusted, Why = part.Why };
            yield return Family.From(view, Divisions.Subject(exclusion.Group, division.By, part.Part), exclusion.Line);
        }

        var all = division.Difference;
        var difference = new PartView(Difference, division) { Exclusion = exclusion, Stands = stands, Compared = all, Basis = all.Basis, Test = all.Test, PAdjusted = all.PAdjusted, Why = all.Why };
        yield return Family.From(difference, Divisions.Subject(exclusion.Group, division.By), exclusion.Line);
    }

    private sealed record PartView(string Kind, GroupInParts By)
    {
        public Exclusion? Exclusion { get; init; }

        public bool? Stands { get; init; }

        public PartFigures? In { get; init; }

        public DifferenceFigures? Compared { get; init; }

        public string? Basis { get; init; }

        public TestFigures? Test { get; init; }

        public double? PAdjusted { get; init; }

        public string? Why { get; init; } = By.Why;

        public string WhyNone => Why ?? (Kind == Division ? OfDivision : "it was not computed");
    }
}
