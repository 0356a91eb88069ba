namespace Auditor.Results;

/// <summary>What the forms of a test and of a covariance are called in sentences and tables; the record has its own short names.</summary>
internal static class FormNames
{
    private const string Normal = " with the normal distribution";

    public static string InWords(string form) => form switch
    {
        "classical" => "classical",
        "hc0" or "hc1" or "hc2" or "hc3" or "cr1" or "cr2" => form.ToUpperInvariant(),
        "newey_west" => "Newey–West",
        "cluster" => "the test over clusters",
        "wild_bootstrap" => "the wild cluster bootstrap",
        "time" => "the test over periods",
        "time_unrestricted" => "the test over periods with the group in the model",
        "score" => "the score test by rows",
        "largest_model_denominator" => "the F over the spread of the largest model",
        "last_in" => "the test with every other left-out group in",
        "root of rss over n" => "the root of the residual sum of squares over the rows",
        _ when form.EndsWith(Normal, StringComparison.Ordinal) => InWords(form[..^Normal.Length]) + Normal,
        _ => form.Replace('_', ' '),
    };
}
