namespace Auditor.SelfTest;

/// <summary>What a difference is relative to when the value itself is smaller, as AGREEMENT.md has it for values near zero.</summary>
internal static class Scales
{
    /// <summary>Shares, F statistics and limits of intervals.</summary>
    public const double Share = 1e-6;

    /// <summary>Logarithms of likelihoods and t: their own unit. A t is an estimate over its standard error, and estimates are compared relative to at least that.</summary>
    public const double Unit = 1;
}
