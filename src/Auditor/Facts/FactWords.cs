namespace Auditor.Facts;

/// <summary>The words that a fact of few words can be, as the record writes them.</summary>
internal static class FactWords
{
    public static readonly IReadOnlyList<string> Verdicts =
        [Results.Verdicts.NotSupported, Results.Verdicts.Supported, Results.Verdicts.Inconclusive, Results.Verdicts.Untestable];

    public static readonly IReadOnlyList<string> Materialities =
        [Results.Materialities.ShownNegligible, Results.Materialities.ShownMaterial, Results.Materialities.NotShown];

    public static readonly IReadOnlyList<string> Bases = ["classical", "hc3", "cluster", "time"];

    public static readonly IReadOnlyList<string> Levels = ["row", "period", "cluster", "unit", "several"];

    /// <summary>What a message says in place of a word of the record.</summary>
    public static string InWords(string fact, string word) => fact switch
    {
        "basis" => Basis(word),
        "level" => word == "several" ? "several levels" : word,
        _ => word.Replace('_', ' '),
    };

    private static string Basis(string basis) => basis switch
    {
        "hc3" => "the robust HC3 test",
        "cluster" => "the test over clusters",
        "time" => "the test over periods",
        _ => "the classical F test",
    };

    public static readonly IReadOnlyList<string> Kinds = ["number", "levels", "date", "text"];

    public static readonly IReadOnlyList<string> ClaimParts = ["final_model", "coefficient", "left_out", "step"];

    /// <summary>A new check is added here, so that rules can name it.</summary>
    public static readonly IReadOnlyList<string> Checks =
    [
        "breusch_pagan", "breusch_pagan_original", "white", "jarque_bera", "shapiro_wilk", "anderson_darling", "durbin_watson", "breusch_godfrey_1",
        "breusch_godfrey_4", "ljung_box_4", "unit_root_residual", "reset", "largest_residual", "chow",
    ];
}
