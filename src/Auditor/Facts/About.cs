namespace Auditor.Facts;

/// <summary>What facts, and so rules, speak about.</summary>
public enum About
{
    Exclusion,
    AllLeftOut,
    Fit,
    Check,
    Claim,
    Step,
    Rows,
    Column,
    Coefficient,
    Entangled,
    Segment,
    Acceptance,
}

/// <summary>The words for them in rule files.</summary>
public static class AboutWords
{
    private static readonly string[] Words =
        ["exclusion", "all_left_out", "fit", "check", "claim", "step", "rows", "column", "coefficient", "entangled", "segment", "acceptance"];

    public static IReadOnlyList<string> All => Words;

    public static string Word(this About about) => Words[(int)about];

    public static About? Parse(string word) => Array.IndexOf(Words, word) is >= 0 and var at ? (About)at : null;
}
