namespace Auditor.Results;

/// <summary>The verdicts that other levels and bounds would give, all else equal. A way of reading the audit, not a part of the JSON record.</summary>
/// <param name="Level">The policy's significance.</param>
/// <param name="Bound">The policy's bound on partial R².</param>
/// <param name="Levels">In ascending order, the policy's among them.</param>
/// <param name="Bounds">Likewise.</param>
/// <param name="Outcomes">By level, bound and group.</param>
public sealed record WhatIf(
    double Level, double Bound, IReadOnlyList<double> Levels, IReadOnlyList<double> Bounds, IReadOnlyList<IReadOnlyList<IReadOnlyList<WhatIfOutcome>>> Outcomes);

public readonly record struct WhatIfOutcome(string Verdict, string Materiality);
