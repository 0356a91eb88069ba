namespace Auditor.Reporting.Html;

/// <summary>What a test is called in words, and the question it answers.</summary>
internal sealed record TestWords(string Name, string Title, string Answers)
{
    /// <summary>The test that the audit does for no group: said once for all, in how to read the page.</summary>
    public const string NotDone = "permutation";

    /// <summary>In the order in which they are shown: the classical one always first.</summary>
    public static IReadOnlyList<TestWords> All { get; } =
    [
        new("classical", "Classical partial F", "Does the group explain more than chance, if errors are normal, independent and equally spread?"),
        new("hc3", "Robust F (HC3)", "The same, without assuming an equal spread of errors."),
        new("score", "Score test by rows", "The same, with the spread taken as if the group had no effect."),
        new("cluster", "Test over clusters (score form)", "The same, when rows of a cluster may move together."),
        new("cr2", "Cluster-robust F (CR2)", "The same, with the group in the model and degrees of freedom fitted to the clusters."),
        new("cr1", "Cluster-robust F (CR1)", "The usual cluster form; it rejects too often with few clusters."),
        new("wild_bootstrap", "Wild cluster bootstrap", "The same, by resampling whole clusters with the group taken as without effect."),
        new("time", "Test over periods (cosine form)", "The same, when errors may carry over from one period to the next."),
        new("time_unrestricted", "Test over periods, group in the model", "The same, with the spread taken from the model with the group in; size and power rest on it."),
        new("newey_west", "Newey–West F", "The usual form for serial dependence; it rejects too often."),
        new(NotDone, "Permutation of residuals", "How often would shuffled residuals look as strong?"),
        new("last_in", "With all other groups in", "Does the group still add something when every other left-out group is in?"),
        new("largest_model_denominator", "Partial F over the largest model's spread", "Is the group strong against what is left when everything tried is in?"),
        new("hc0", "Robust F (HC0)", "Given so that an author's figure can be reproduced."),
        new("hc1", "Robust F (HC1)", "Given so that an author's figure can be reproduced."),
        new("hc2", "Robust F (HC2)", "Given so that an author's figure can be reproduced."),
    ];

    public static string TitleOf(string name) => All.FirstOrDefault(test => test.Name == name)?.Title ?? name;
}
