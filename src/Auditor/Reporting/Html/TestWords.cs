namespace Auditor.Reporting.Html;

/// <summary>What a test is called in words, and the question it answers.</summary>
internal sealed record TestWords(string Name, string Title, string Answers)
{
    /// <summary>In the order in which they are shown: the classical one always first.</summary>
    public static IReadOnlyList<TestWords> All { get; } =
    [
        new("classical", "Partial F", "Does the group explain more than chance, if errors are normal, independent and equally spread?"),
        new("hc3", "Wald F, HC3", "The same, without assuming an equal spread of errors."),
        new("score", "Score form by rows", "The same, with the spread taken as if the group had no effect."),
        new("cluster", "Score form by clusters", "The same, when rows of a cluster may move together."),
        new("cr2", "Wald F, CR2", "The same, with the group in the model and degrees of freedom fitted to the clusters."),
        new("cr1", "Wald F, CR1", "The usual cluster form; it rejects too often with few clusters."),
        new("wild_bootstrap", "Wild cluster bootstrap", "The same, by resampling whole clusters with the group taken as without effect."),
        new("time", "Cosine form by periods", "The same, when errors may carry over from one period to the next."),
        new("time_unrestricted", "Cosine form, group in the model", "The same, with the spread taken from the model with the group in; size and power rest on it."),
        new("newey_west", "Wald F, Newey–West", "The usual form for serial dependence; it rejects too often."),
        new("permutation", "Permutation of residuals", "How often would shuffled residuals look as strong?"),
        new("last_in", "Last in", "Does the group still add something when every other left-out group is in?"),
        new("largest_model_denominator", "Partial F over the largest model's spread", "Is the group strong against what is left when everything tried is in?"),
        new("hc0", "Wald F, HC0", "Given so that an author's figure can be reproduced."),
        new("hc1", "Wald F, HC1", "Given so that an author's figure can be reproduced."),
        new("hc2", "Wald F, HC2", "Given so that an author's figure can be reproduced."),
    ];

    public static string TitleOf(string name) => All.FirstOrDefault(test => test.Name == name)?.Title ?? name;
}
