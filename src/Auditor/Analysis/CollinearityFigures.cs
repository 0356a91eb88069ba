using Auditor.Numerics.Collinearity;
using Auditor.Results;

namespace Auditor.Analysis;

/// <summary>Collinearity of the final model as the record shows it.</summary>
internal static class CollinearityFigures
{
    /// <summary>Up to so many coefficients the proportions of all indices are given.</summary>
    private const int FewCoefficients = 100;

    /// <summary>Beyond that, those of so many of the largest.</summary>
    private const int LargestShown = 20;

    public static Results.Collinearity Of(RowSetFit rows)
    {
        var condition = rows.Fit.Condition;
        var labels = rows.Fit.Columns.Select(column => rows.Plan.Labels[column]).ToList();
        return new Results.Collinearity(
            Terms(rows),
            condition.Indices,
            [.. Enumerable.Range(0, labels.Count).Skip(labels.Count <= FewCoefficients ? 0 : labels.Count - LargestShown)
                .Select(j => new VarianceProportions(condition.Indices[j], Proportions(condition, j, labels)))])
        {
            Why = labels.Count <= FewCoefficients ? null : "variance proportions are given for the 20 largest condition indices only: the model has more than 100 coefficients",
        };
    }

    private static List<TermCollinearity> Terms(RowSetFit rows)
    {
        var (terms, column) = (new List<TermCollinearity>(), rows.Plan.Layout.Intercept ? 1 : 0);
        foreach (var term in rows.Plan.FinalTerms)
        {
            var width = term.ColumnLabels.Count;
            var inflation = VarianceInflation.Of(rows.Final, [.. Enumerable.Range(column, width)]);
            terms.Add(new TermCollinearity(term.Term.Label, inflation?.Df ?? 0, inflation?.Gvif, inflation?.Scaled));
            column += width;
        }

        return terms;
    }

    private static OrderedDictionary<string, double> Proportions(ConditionIndices condition, int index, List<string> labels)
    {
        var proportions = new OrderedDictionary<string, double>(StringComparer.Ordinal);
        for (var k = 0; k < labels.Count; k++)
        {
            proportions[labels[k]] = condition.Proportions[index, k];
        }

        return proportions;
    }
}
