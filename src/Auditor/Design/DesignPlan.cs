using Auditor.Numerics.Factor;

namespace Auditor.Design;

/// <summary>Which columns of a design belong to which term, and what they are called: the intercept, the final terms, some groups, the response.</summary>
public sealed class DesignPlan
{
    private readonly BoundModel _model;

    /// <param name="groups">Positions of the groups (in the model) that this design holds, in order.</param>
    public DesignPlan(BoundModel model, IReadOnlyList<int> groups)
    {
        _model = model;
        Groups = groups;
        FinalTerms = model.FinalTerms;
        GroupTerms = [.. groups.Select(group => model.Groups[group].Terms)];
        var final = FinalTerms.SelectMany(term => term.ColumnLabels);
        Labels = Distinct([
            .. model.Intercept ? ["intercept"] : Array.Empty<string>(),
            .. final,
            .. GroupTerms.SelectMany(terms => terms).SelectMany(term => term.ColumnLabels),
        ]);
        Layout = new DesignLayout(model.Intercept, Width(FinalTerms) + (model.Intercept ? 1 : 0), Ranges());
    }

    public IReadOnlyList<int> Groups { get; }

    public IReadOnlyList<BoundTerm> FinalTerms { get; }

    public IReadOnlyList<IReadOnlyList<BoundTerm>> GroupTerms { get; }

    /// <summary>One label for each column but the response; equal ones are told apart by a number.</summary>
    public IReadOnlyList<string> Labels { get; }

    public DesignLayout Layout { get; }

    /// <summary>All terms with the first column of each, the response last.</summary>
    internal IEnumerable<(BoundTerm Term, int Column)> TermColumns()
    {
        var column = _model.Intercept ? 1 : 0;
        foreach (var term in FinalTerms.Concat(GroupTerms.SelectMany(terms => terms)).Append(_model.Response))
        {
            yield return (term, column);
            column += term.ColumnLabels.Count;
        }
    }

    private static int Width(IEnumerable<BoundTerm> terms) => terms.Sum(term => term.ColumnLabels.Count);

    private List<ColumnRange> Ranges()
    {
        var (ranges, start) = (new List<ColumnRange>(), Width(FinalTerms) + (_model.Intercept ? 1 : 0));
        foreach (var width in GroupTerms.Select(Width))
        {
            ranges.Add(new ColumnRange(start, width));
            start += width;
        }

        return ranges;
    }

    private static List<string> Distinct(IReadOnlyList<string> labels)
    {
        var (seen, distinct) = (new Dictionary<string, int>(StringComparer.Ordinal), new List<string>(labels.Count));
        foreach (var label in labels)
        {
            seen[label] = seen.GetValueOrDefault(label) + 1;
            distinct.Add(seen[label] == 1 ? label : string.Create(Invariant, $"{label} ({seen[label]})"));
        }

        return distinct;
    }

    private static System.Globalization.CultureInfo Invariant => System.Globalization.CultureInfo.InvariantCulture;
}
