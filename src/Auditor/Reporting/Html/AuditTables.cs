using Auditor.Results;

namespace Auditor.Reporting.Html;

/// <summary>The tables that stand once on a page.</summary>
internal static class AuditTables
{
    public static ReportTable Checks(AuditRecord record, double level) => ReportTable.Of(
        "Checks of the final model’s residuals",
        record.Checks,
        new("Assumption", "text", check => Cell.Words(CheckWords.Spaced(check.Assumption))),
        new("At this level it is", "text", check => Cell.Words(CheckWords.Conclusion(check.Contradicts))),
        new("Check", "text", check => Cell.Words(CheckWords.Title(check))),
        new("Statistic", "number", check => Cell.Number(check.Statistic, check.Why)),
        new("on df", "number", check => Cell.Df(check.Df, check.Df2, check.Why ?? "Its distribution has no degrees of freedom.")),
        new("p", "number", check => Cell.Probability(check.DecisiveP, check.PSimulated is null ? check.Log10P : null, level, check.Why)),
        new("How large", "text", check => CheckWords.Size(check) is { } size ? Cell.Words(size) : Cell.Missing(check.Why)));

    public static ReportTable Influence(Influence influence)
    {
        const string leverageOne = "The row has leverage 1, or the fit without it leaves nothing to compare it with.";
        return ReportTable.Of(
            "Rows that move the fit most, by Cook’s distance",
            influence.Largest,
            new("Row", "number", row => Cell.Count(row.Row)),
            new("Label", "name", row => Cell.Name(row.Label, "The row has no label.")),
            new("Cook’s distance", "number", row => Cell.Number(row.CooksDistance, leverageOne)),
            new("Residual, studentised without the row", "number", row => Cell.Number(row.StudentisedResidual, leverageOne)),
            new("Leverage", "number", row => Cell.Number(row.Leverage)),
            new("DFFITS", "number", row => Cell.Number(row.Dffits, leverageOne)));
    }

    public static ReportTable Collinearity(Collinearity collinearity) => ReportTable.Of(
        "How far each term can be told from the others",
        collinearity.Terms,
        new("Term", "name", term => Cell.Name(term.Term)),
        new("Columns", "number", term => Cell.Count(term.Df)),
        new("Standard error multiplied by", "number", term => Cell.Number(term.GvifScaled, "The term is aliased.")),
        new("Generalised variance inflation factor", "number", term => Cell.Number(term.Gvif, "The term is aliased.")));

    public static ReportTable Proportions(Collinearity collinearity) => ReportTable.Of(
        "Condition indices and the coefficients whose variance they carry",
        collinearity.VarianceProportions,
        new("Condition index", "number", index => Cell.Number(index.ConditionIndex)),
        new("Coefficients with half of their variance or more here", "text", index => Cell.Words(Carried(index))));

    public static ReportTable Entangled(AuditRecord record, double level)
    {
        const string why = "It was not computed for this set.";
        return ReportTable.Of(
            "Entangled groups",
            record.Entangled,
            new("Groups", "name", set => Cell.Name(string.Join(" + ", set.Groups))),
            new("How", "text", set => Cell.Words(Kind(set.Kind))),
            new("F", "number", set => Cell.Number(set.F, why)),
            new("on df", "number", set => Cell.Df(set.Df1, set.Df2, why)),
            new("p", "number", set => Cell.Probability(set.P, null, level, why)),
            new("p, adjusted", "number", set => Cell.Probability(set.PAdjusted, null, level, why)));
    }


    private static string Carried(VarianceProportions index)
    {
        const double half = 0.5;
        string[] names = [.. index.Proportions.Where(pair => pair.Value >= half).Select(pair => $"{pair.Key} ({NumberText.Percent(pair.Value)})")];
        return names.Length == 0 ? "no coefficient" : string.Join(", ", names);
    }

    private static string Kind(string kind) => kind switch
    {
        "suppressors" => "rejected together, none of them alone: each hides another",
        "stand_ins" => "needed together, none of them alone: each can replace another",
        _ => CheckWords.Spaced(kind),
    };
}
